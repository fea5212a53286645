import { createHash } from 'node:crypto';
import type { RequestEvent } from '@sveltejs/kit';
import type { Context } from '../context';
import { inTransaction } from '../db/client';
import * as keys from '../db/queries/idempotency';
import { readBody } from './body';
import { problem, problemFrom } from './problem';

/** How long a key is remembered. */
export const keyMs = 24 * 3_600_000;

/** Rolls the transaction back and carries the response out of it. */
class NotKept extends Error {
	constructor(readonly response: Response) {
		super('rolled back');
	}
}

const busy = () =>
	problem(409, 'Conflict', 'A request with this Idempotency-Key is still at work. Ask again in a moment.');

const otherRequest = () =>
	problem(
		422,
		'Not accepted',
		'This Idempotency-Key was used for a different request. Nothing was stored; give each request a key of its own.'
	);

const malformed = () =>
	problem(400, 'Malformed key', 'Idempotency-Key must have 1 to 190 visible characters. Nothing was stored.');

/** A key as sent, bare or, as a structured field, in quotes. */
function readKey(header: string): string | null {
	const key = /^"(.*)"$/.exec(header)?.[1] ?? header;
	return /^[\x21-\x7e]{1,190}$/.test(key) ? key : null;
}

/** Does the work and keeps its answer in one transaction. A refusal changed nothing, so it is rolled back and not remembered. */
async function firstTime(ctx: Context, row: keys.KeyedRequest, run: (ctx: Context) => Promise<Response>) {
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const state = await keys.claim(tx, row);
			if (state !== 'claimed') return state;
			const response = await run({ ...ctx, db: tx });
			if (response.status >= 300) throw new NotKept(response);
			const body = await response.clone().text();
			const location = response.headers.get('location');
			await keys.keep(tx, row.userId, row.key, { status: response.status, body, location });
			return response;
		});
	} catch (error) {
		if (error instanceof NotKept) return error.response;
		throw error;
	}
}

async function replay(ctx: Context, row: keys.KeyedRequest): Promise<Response | null> {
	const before = await keys.read(ctx.db, row.userId, row.key);
	if (!before) return null;
	if (ctx.now.getTime() - before.createdAt.getTime() > keyMs) {
		// Only a key that is seen to be old is removed: a blind DELETE would wait for whoever holds it.
		await keys.forget(ctx.db, row.userId, row.key, new Date(ctx.now.getTime() - keyMs));
		return null;
	}
	if (before.bodyHash !== row.bodyHash || before.method !== row.method || before.path !== row.path)
		return otherRequest();
	if (before.status === null) return busy();
	return new Response(before.body, {
		status: before.status,
		headers: {
			'content-type': 'application/json',
			'cache-control': 'no-store',
			'idempotency-replayed': 'true',
			...(before.location === null ? {} : { location: before.location })
		}
	});
}

/**
 * Runs a POST or PUT so that the same Idempotency-Key has its effect once, even when the answer was lost on its way.
 * The work must use the context it is given: it is the transaction that also holds the key.
 * @example return idempotent(event, ctx, async (ctx) => answer(await recordRun(ctx, body.value), 201));
 */
export async function idempotent(
	event: Pick<RequestEvent, 'request' | 'url'>,
	ctx: Context,
	run: (ctx: Context) => Promise<Response>
): Promise<Response> {
	const header = event.request.headers.get('idempotency-key');
	if (header === null) return run(ctx);
	const key = readKey(header);
	if (key === null) return malformed();
	const body = await readBody(event);
	if (!body.ok) return problemFrom(body);
	const row: keys.KeyedRequest = {
		userId: ctx.actor.id,
		key,
		method: event.request.method,
		path: (event.url.pathname + event.url.search).slice(0, 500),
		bodyHash: createHash('sha256').update(body.value).digest('hex'),
		createdAt: ctx.now
	};
	const known = await replay(ctx, row);
	if (known) return known;
	const result = await firstTime(ctx, row, run);
	if (result instanceof Response) return result;
	return (result === 'taken' ? await replay(ctx, row) : null) ?? busy();
}
