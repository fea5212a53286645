import type { Handle, RequestEvent } from '@sveltejs/kit';
import type { Actor } from '../../domain/people/roles';
import { database } from '../app';
import { clock } from '../clock';
import * as apiTokens from '../db/queries/api-tokens';
import * as sessions from '../db/queries/sessions';
import { hashOf } from './secret';
import { cookieOptions, renewedUntil, sessionCookie } from './session-cookie';

const tokenUseStepMs = 60_000;

/** What a row per role says together; null when there is none. */
function actorFrom(rows: { id: string; name: string; email: string; role: Actor['roles'][number] }[]) {
	const [first] = rows;
	if (!first) return null;
	const { id, name, email } = first;
	return { id, name, email, roles: rows.map((row) => row.role) };
}

async function bySession(event: RequestEvent): Promise<Actor | null> {
	const token = event.cookies.get(sessionCookie());
	if (!token) return null;
	const now = clock.now();
	const { db } = database();
	const rows = await sessions.actorRows(db, token, now);
	const until = rows[0] ? renewedUntil(rows[0].expires, now) : null;
	if (until) {
		await sessions.prolong(db, token, until);
		event.cookies.set(sessionCookie(), token, { ...cookieOptions(), expires: until });
	}
	return actorFrom(rows);
}

async function byToken(secret: string): Promise<Actor | null> {
	const now = clock.now();
	const { db } = database();
	const rows = await apiTokens.actorRows(db, hashOf(secret), now);
	const actor = actorFrom(rows);
	const [first] = rows;
	if (!actor || !first) return null;
	const { tokenId, lastUsedAt, scopes } = first;
	if (!lastUsedAt || now.getTime() - lastUsedAt.getTime() >= tokenUseStepMs) {
		await apiTokens.markUsed(db, tokenId, now, new Date(now.getTime() - tokenUseStepMs));
	}
	return { ...actor, scopes };
}

/** Who sends this request. On /api/ an Authorization header decides alone, so that a cookie never lends a script its rights. */
export async function readActor(event: RequestEvent): Promise<Actor | null> {
	const authorization = event.request.headers.get('authorization');
	if (event.url.pathname.startsWith('/api/') && authorization !== null) {
		const secret = /^Bearer (calipress_[\w-]{20,200})$/i.exec(authorization)?.[1];
		return secret === undefined ? null : byToken(secret);
	}
	return bySession(event);
}

const withoutPeople = new Set(['/healthz', '/readyz']);

/** Reads identity once a request, for everything after it. */
export const identify: Handle = async ({ event, resolve }) => {
	event.locals.actor = withoutPeople.has(event.url.pathname) ? null : await readActor(event);
	return resolve(event);
};
