import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { done, refuse } from '../../../src/lib/domain/shared/outcome';
import type { Context } from '../../../src/lib/server/context';
import { inTransaction } from '../../../src/lib/server/db/client';
import * as audit from '../../../src/lib/server/db/queries/audit';
import { sweep } from '../../../src/lib/server/db/queries/idempotency';
import { auditEvent, idempotencyKey } from '../../../src/lib/server/db/schema';
import { answer, created, idempotent } from '../../../src/lib/server/http/api';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { people } from '../../support/people';

let database: TestDatabase;
let who: Record<Role, Actor>;
const now = new Date('2026-11-11T08:00:00.000Z');

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

interface Sent {
	key?: string;
	body?: unknown;
	path?: string;
	as?: Role;
	at?: Date;
	work?: (ctx: Context) => Promise<Response>;
}

/** Stands for a service that creates one row, in a transaction of its own, as they all do. */
const create = (ctx: Context) =>
	inTransaction(ctx.db, async (tx) => {
		const entry = { at: ctx.now, actorId: ctx.actor.id, act: 'made', subjectKind: 'thing', subjectId: 1 };
		await audit.append(tx, [entry]);
		return answer(done({ made: (await tx.select().from(auditEvent)).length }), 201);
	});

function send({
	key,
	body = { n: 1 },
	path = '/api/v1/things',
	as = 'tester',
	at = now,
	work = create
}: Sent) {
	const headers: Record<string, string> = key === undefined ? {} : { 'idempotency-key': key };
	return idempotent(fakeEvent({ path, headers, json: body }), contextFor(database.db, who[as], at), work);
}
const rows = async () => (await database.db.select().from(auditEvent)).length;

describe('Idempotency-Key', () => {
	it('gives the same request its effect once and the same answer twice', async () => {
		const first = await send({ key: 'a' });
		const again = await send({ key: 'a' });
		expect([first.status, again.status]).toEqual([201, 201]);
		expect(await again.json()).toEqual(await first.json());
		expect(first.headers.get('idempotency-replayed')).toBeNull();
		expect(again.headers.get('idempotency-replayed')).toBe('true');
		expect(await rows()).toBe(1);
	});

	it('says again where what was made is read, and nothing where the first answer said nothing', async () => {
		// RFC 9110, section 15.3.2: a 201 names what was created by its Location.
		const work = async (ctx: Context) => {
			await create(ctx);
			return created(done({ slug: 'first' }), (row) => `/api/v1/things/${row.slug}`);
		};
		const first = await send({ key: 'a', work });
		const again = await send({ key: 'a', work });
		expect([first.status, again.status]).toEqual([201, 201]);
		expect(first.headers.get('location')).toBe('/api/v1/things/first');
		expect(again.headers.get('location')).toBe('/api/v1/things/first');
		await send({ key: 'b' });
		expect((await send({ key: 'b' })).headers.has('location')).toBe(false);
	});

	it('left out, each request has its effect', async () => {
		await send({});
		await send({});
		expect(await rows()).toBe(2);
	});

	it('refuses another body or another address under the same key', async () => {
		await send({ key: 'a' });
		for (const other of [{ body: { n: 2 } }, { path: '/api/v1/others' }]) {
			const response = await send({ key: 'a', ...other });
			expect(response.status).toBe(422);
			expect(response.headers.get('content-type')).toBe('application/problem+json');
		}
		expect(await rows()).toBe(1);
	});

	it('is one person’s own: somebody else’s same key is another key', async () => {
		await send({ key: 'a' });
		expect((await send({ key: 'a', as: 'writer' })).headers.get('idempotency-replayed')).toBeNull();
		expect(await rows()).toBe(2);
	});

	it('tells who comes while the first is at work to ask again, and has one effect', async () => {
		let open = (): void => undefined;
		let atWork = (): void => undefined;
		const gate = new Promise<void>((resolve) => (open = resolve));
		const started = new Promise<void>((resolve) => (atWork = resolve));
		const first = send({
			key: 'a',
			work: async (ctx) => {
				atWork();
				await gate;
				return create(ctx);
			}
		});
		await started;
		const second = await send({ key: 'a' });
		expect(second.status).toBe(409);
		open();
		expect((await first).status).toBe(201);
		expect((await send({ key: 'a' })).headers.get('idempotency-replayed')).toBe('true');
		expect(await rows()).toBe(1);
	});

	it('holds under twenty at once', async () => {
		const all = await Promise.all(Array.from({ length: 20 }, () => send({ key: 'a' })));
		expect(all.every(({ status }) => status === 201 || status === 409)).toBe(true);
		expect(all.filter(({ status }) => status === 201).length).toBeGreaterThan(0);
		expect(await rows()).toBe(1);
	});

	it('forgets a refusal, which changed nothing, so that the mended request goes through', async () => {
		const refused = await send({
			key: 'a',
			work: async (ctx) => {
				await create(ctx);
				return answer(refuse('invalid', 'No.'));
			}
		});
		expect(refused.status).toBe(422);
		expect(await rows()).toBe(0);
		expect((await send({ key: 'a', body: { n: 2 } })).status).toBe(201);
	});

	it('forgets a failure, with what was half done', async () => {
		const broken = send({
			key: 'a',
			work: async (ctx) => {
				await create(ctx);
				throw new Error('the power went');
			}
		});
		await expect(broken).rejects.toThrow('the power went');
		expect(await rows()).toBe(0);
		expect((await send({ key: 'a' })).status).toBe(201);
	});

	it('is kept for 24 hours, then swept', async () => {
		await send({ key: 'a' });
		const at = (hours: number) => new Date(now.getTime() + hours * 3_600_000);
		expect((await send({ key: 'a', at: at(24) })).headers.get('idempotency-replayed')).toBe('true');
		expect((await send({ key: 'a', at: at(24.01) })).headers.get('idempotency-replayed')).toBeNull();
		await sweep(database.db, at(24));
		expect(await database.db.select().from(idempotencyKey)).toHaveLength(1);
		await sweep(database.db, at(25));
		expect(await database.db.select().from(idempotencyKey)).toHaveLength(0);
	});

	it('must be 1 to 190 visible characters, bare or in quotes', async () => {
		for (const key of ['', 'a b', 'x'.repeat(191)]) expect((await send({ key })).status, key).toBe(400);
		await send({ key: '"a"' });
		expect((await send({ key: 'a' })).headers.get('idempotency-replayed')).toBe('true');
	});
});
