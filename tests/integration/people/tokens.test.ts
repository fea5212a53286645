import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { may } from '../../../src/lib/domain/people/policy';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { readActor } from '../../../src/lib/server/auth/identify';
import { run as runToken } from '../../../src/lib/server/cli/token';
import { apiToken, auditEvent, session, user } from '../../../src/lib/server/db/schema';
import { createToken } from '../../../src/lib/server/services/people/create-token';
import { markLeft } from '../../../src/lib/server/services/people/mark-left';
import { revokeToken } from '../../../src/lib/server/services/people/revoke-token';
import { GET as whoAmI } from '../../../src/routes/api/v1/me/+server';
import { origin, useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { people } from '../../support/people';

let database: TestDatabase;
let who: Record<Role, Actor>;

beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
});
afterAll(() => database.close());
beforeEach(async () => {
	vi.useRealTimers();
	await emptyTables(database);
	who = await people(database.db);
});

const as = (role: Role) => contextFor(database.db, who[role], new Date());
const ask = (authorization: string, more: { path?: string; cookies?: Map<string, string> } = {}) =>
	readActor(fakeEvent({ path: '/api/v1/campaigns', headers: { authorization }, ...more }));

async function made(days: '30' | 'never' = '30') {
	const input = { name: 'bench machine', scopes: ['bench:read' as const], days };
	const outcome = await createToken(as('tester'), input);
	if (!outcome.ok) throw new Error(outcome.message);
	return outcome.value;
}

describe('a token', () => {
	it('speaks for its person within its scopes', async () => {
		const { token } = await made();
		expect(token).toMatch(/^calipress_[\w-]{43}$/);
		const actor = await ask(`Bearer ${token}`);
		expect(actor).toEqual({ ...who.tester, scopes: ['bench:read'] });
		expect(may(actor, 'bench.read')).toBe(true);
		expect(may(actor, 'run.record')).toBe(false);
		expect(may(actor, 'account.use')).toBe(false);
		const answer = whoAmI(fakeEvent({ path: '/api/v1/me', actor }) as never);
		expect(await answer.json()).toEqual({
			name: who.tester.name,
			email: who.tester.email,
			roles: ['tester'],
			scopes: ['bench:read']
		});
	});

	it('is stored as a SHA-256 alone, and stands in no log', async () => {
		const { token } = await made();
		const rows = [await database.db.select().from(apiToken), await database.db.select().from(auditEvent)];
		expect(JSON.stringify(rows)).not.toContain(token.slice('calipress_'.length));
		expect(rows[0]).toMatchObject([{ tokenHash: expect.stringMatching(/^[0-9a-f]{64}$/) }]);
	});

	it('decides alone on the API: a cookie beside a bad token helps nobody', async () => {
		await database.db
			.insert(session)
			.values({ sessionToken: 'held', userId: who.admin.id, expires: new Date(Date.now() + 60_000) });
		const cookies = new Map([['__Secure-authjs.session-token', 'held']]);
		expect((await readActor(fakeEvent({ path: '/api/v1/me', cookies })))?.id).toBe(who.admin.id);
		for (const header of ['Bearer calipress_unknownunknownunknown', 'Bearer x', 'Basic YTpi', ''])
			expect(await ask(header, { cookies }), header).toBeNull();
		const { token } = await made();
		expect((await ask(`Bearer ${token}`, { cookies }))?.id).toBe(who.tester.id);
	});

	it('is no key to the pages', async () => {
		const { token } = await made();
		expect(await ask(`Bearer ${token}`, { path: '/bench' })).toBeNull();
	});

	it('ends when it runs out, is revoked, or its person leaves', async () => {
		const first = await made();
		const lasting = await made('never');
		vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 30 * 86_400_000 + 1000 });
		expect(await ask(`Bearer ${first.token}`)).toBeNull();
		expect(await ask(`Bearer ${lasting.token}`)).not.toBeNull();
		expect(await revokeToken(as('writer'), lasting.id)).toMatchObject({ reason: 'not_found' });
		expect(await revokeToken(as('tester'), lasting.id)).toMatchObject({ ok: true });
		expect(await ask(`Bearer ${lasting.token}`)).toBeNull();
		const another = await made('never');
		await markLeft(as('admin'), who.tester.id, { reason: 'moved on', version: 1 });
		expect(await ask(`Bearer ${another.token}`)).toBeNull();
		await database.db.update(user).set({ leftAt: null }).where(eq(user.id, who.tester.id));
		expect(await ask(`Bearer ${another.token}`)).toBeNull();
	});

	it('notes its use once a minute at most', async () => {
		const { token } = await made('never');
		const lastUsed = async () => (await database.db.select().from(apiToken))[0]?.lastUsedAt?.getTime();
		const start = Date.now();
		vi.useFakeTimers({ toFake: ['Date'], now: start });
		await ask(`Bearer ${token}`);
		expect(await lastUsed()).toBe(start);
		vi.setSystemTime(start + 59_000);
		await ask(`Bearer ${token}`);
		expect(await lastUsed()).toBe(start);
		vi.setSystemTime(start + 61_000);
		await ask(`Bearer ${token}`);
		expect(await lastUsed()).toBe(start + 61_000);
	});

	it('cannot be made with scopes that the roles do not hold, nor by a token', async () => {
		const input = { name: 'x', scopes: ['bench:write' as const], days: 'never' as const };
		expect(await createToken(as('writer'), input)).toMatchObject({
			reason: 'invalid',
			fields: { scopes: [expect.stringContaining('bench:write')] }
		});
		const scripted = { ...as('tester'), actor: { ...who.tester, scopes: ['bench:write' as const] } };
		expect(await createToken(scripted, input)).toMatchObject({ reason: 'forbidden' });
		expect(await database.db.select().from(apiToken)).toHaveLength(0);
	});
});

describe('npm run token', () => {
	it('prints one token that works, or says why not', async () => {
		const lines: string[] = [];
		const run = (...args: string[]) => {
			lines.length = 0;
			return runToken(args, {
				db: database.db,
				now: new Date(),
				origin,
				print: (line) => void lines.push(line)
			});
		};
		expect(await run(who.tester.email, 'bench:read', 'bench:write')).toBe(0);
		expect(lines).toHaveLength(1);
		expect((await ask(`Bearer ${lines[0]}`))?.scopes).toEqual(['bench:read', 'bench:write']);
		expect(await run(who.liaison.email, 'bench:read')).toBe(1);
		expect(lines[0]).toContain('bench:read');
		expect(await run('nobody@northlight.example', 'bench:read')).toBe(1);
		expect(await run(who.tester.email)).toBe(2);
		expect(await run(who.tester.email, 'bench:everything')).toBe(2);
		expect(lines[0]).toContain('Usage: npm run token');
	});
});
