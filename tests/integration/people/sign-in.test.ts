import { isRedirect } from '@sveltejs/kit';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { authHandle } from '../../../src/lib/server/auth/auth';
import { readActor } from '../../../src/lib/server/auth/identify';
import { hashPassword } from '../../../src/lib/server/auth/password';
import { mail, session, user, userRole, verificationToken } from '../../../src/lib/server/db/schema';
import { POST as signOut } from '../../../src/routes/(account)/sign-out/+server';
import { actions, load } from '../../../src/routes/(account)/sign-in/+page.server';
import { load as loadLink } from '../../../src/routes/(account)/sign-in/link/+page.server';
import { origin, useApp } from '../../support/app';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent, type Asked } from '../../support/event';
import { people } from '../../support/people';

const password = 'layout blue and proof red';
const cookie = '__Secure-authjs.session-token';
let database: TestDatabase;
let who: Record<Role, Actor>;
let passwordHash: string;

beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
	passwordHash = await hashPassword(password);
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
	await database.db.update(user).set({ passwordHash });
	vi.useRealTimers();
});

/** Where a handler sends the browser, or what it answers. */
async function outcomeOf(run: () => unknown): Promise<{ to?: string; status?: number; data?: unknown }> {
	try {
		const result = (await run()) as { status?: number; data?: unknown };
		return { status: result.status ?? 200, data: result.data ?? result };
	} catch (thrown) {
		if (isRedirect(thrown)) return { to: thrown.location };
		throw thrown;
	}
}

const eventFor = (asked: Asked) => fakeEvent(asked) as never;
const signIn = (form: Record<string, string>, more: Partial<Asked> = {}) =>
	outcomeOf(() => actions.password(eventFor({ path: '/sign-in?/password', form, ...more })));
const askForLink = (form: Record<string, string>, more: Partial<Asked> = {}) =>
	outcomeOf(() => actions.link(eventFor({ path: '/sign-in?/link', form, ...more })));
const messageOf = (data: unknown) => (data as { form: { message?: string } }).form.message;
const email = 'tester@northlight.example';

describe('by password', () => {
	it('signs in, whatever the case of the address, and is then known', async () => {
		const cookies = new Map<string, string>();
		const { to } = await signIn(
			{ email: ` Tester@Northlight.example`, password, to: '/bench?q=1' },
			{ cookies }
		);
		expect(to).toBe('/bench?q=1');
		const actor = await readActor(fakeEvent({ path: '/bench', cookies }));
		expect(actor).toEqual({ ...who.tester, roles: ['tester'] });
	});

	it('lands on the own place without a wish, and never on another site', async () => {
		const wishes = ['', 'https://elsewhere.example/', '//elsewhere.example', '/\\elsewhere.example'];
		for (const to of wishes) expect(await signIn({ email, password, to })).toEqual({ to: '/sign-in' });
		const homes = { tester: '/desk', liaison: '/partners' } as const;
		for (const [role, to] of Object.entries(homes)) {
			const event = eventFor({ path: '/sign-in', actor: who[role as Role] });
			expect(await outcomeOf(() => load(event))).toEqual({ to });
		}
	});

	it('gives the same answer to a wrong password, an unknown address, no password, no role and who has left', async () => {
		await database.db.update(user).set({ passwordHash: null }).where(eq(user.id, who.writer.id));
		await database.db.delete(userRole).where(eq(userRole.userId, who.editor.id));
		await database.db.update(user).set({ leftAt: new Date() }).where(eq(user.id, who.liaison.id));
		const answers = await Promise.all([
			signIn({ email, password: 'wrong' }),
			signIn({ email: 'nobody@northlight.example', password }),
			signIn({ email: who.writer.email, password }),
			signIn({ email: who.editor.email, password }),
			signIn({ email: who.liaison.email, password })
		]);
		expect(new Set(answers.map(({ status, data }) => `${status} ${messageOf(data)}`))).toEqual(
			new Set(['422 The address and the password do not go together. Check both, or have a link sent.'])
		);
	});

	it('keeps the address that was typed, and never the password', async () => {
		const { data } = await signIn({ email, password: 'wrong' });
		expect(data).toMatchObject({ form: { data: { email, password: '' } } });
	});

	it('stops after eight attempts at one account, says when to try again, and lets others in', async () => {
		for (let i = 0; i < 8; i++) expect((await signIn({ email, password: `guess ${i}` })).status).toBe(422);
		const event = fakeEvent({ path: '/sign-in?/password', form: { email, password } });
		const { status, data } = await outcomeOf(() => actions.password(event as never));
		expect(status).toBe(429);
		expect(messageOf(data)).toMatch(/Too many attempts.*Try again in 15 minutes\. An e-mailed link works/);
		expect(Number(event.sent['retry-after'])).toBeGreaterThan(890);
		expect((await signIn({ email: who.writer.email, password })).to).toBe('/sign-in');
		vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 15 * 60_000 + 1000 });
		expect((await signIn({ email, password })).to).toBe('/sign-in');
	});

	it('stops forty attempts from one address, over any number of accounts', async () => {
		const guess = (i: number) => signIn({ email: `nobody${i}@northlight.example`, password: 'x' });
		const first = await Promise.all(Array.from({ length: 40 }, (_, i) => guess(i)));
		expect(first.every(({ status }) => status === 422)).toBe(true);
		expect((await guess(41)).status).toBe(429);
		expect((await signIn({ email, password }, { address: '192.0.2.8' })).to).toBe('/sign-in');
	});

	it('counts attempts that come at once', async () => {
		const all = await Promise.all(Array.from({ length: 12 }, () => signIn({ email, password: 'wrong' })));
		expect(all.filter(({ status }) => status === 422)).toHaveLength(8);
	});
});

describe('a session', () => {
	it('ends at sign-out, also for a copy of the cookie', async () => {
		const cookies = new Map<string, string>();
		await signIn({ email, password }, { cookies });
		const copy = new Map(cookies);
		await outcomeOf(() => signOut(eventFor({ method: 'POST', path: '/sign-out', cookies })));
		expect(cookies.has(cookie)).toBe(false);
		expect(await readActor(fakeEvent({ path: '/', cookies: copy }))).toBeNull();
	});

	it('is not taken over: signing in makes a new one and ends the old', async () => {
		const planted = new Map([[cookie, 'planted-by-somebody']]);
		await signIn({ email, password }, { cookies: planted });
		expect(planted.get(cookie)).not.toBe('planted-by-somebody');
		const first = new Map(planted);
		await signIn({ email, password }, { cookies: planted });
		expect(await readActor(fakeEvent({ path: '/', cookies: first }))).toBeNull();
	});

	it('counts for nothing once it has run out, or its person has left or lost every role', async () => {
		const cookies = new Map<string, string>();
		await signIn({ email, password }, { cookies });
		const known = () => readActor(fakeEvent({ path: '/', cookies }));
		await database.db.update(user).set({ leftAt: new Date() });
		expect(await known()).toBeNull();
		await database.db.update(user).set({ leftAt: null });
		expect((await known())?.email).toBe(email);
		await database.db.update(session).set({ expires: new Date(Date.now() - 1) });
		expect(await known()).toBeNull();
		await database.db.update(session).set({ expires: new Date(Date.now() + 60_000) });
		await database.db.delete(userRole);
		expect(await known()).toBeNull();
	});

	it('slides: renewed when a day has passed, not written before', async () => {
		const cookies = new Map<string, string>();
		await signIn({ email, password }, { cookies });
		const ends = async () => (await database.db.select().from(session))[0]?.expires.getTime() ?? 0;
		const first = await ends();
		vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 23 * 3_600_000 });
		await readActor(fakeEvent({ path: '/', cookies }));
		expect(await ends()).toBe(first);
		vi.setSystemTime(Date.now() + 2 * 3_600_000);
		await readActor(fakeEvent({ path: '/', cookies }));
		expect(await ends()).toBe(Date.now() + 30 * 86_400_000);
	});
});

describe('by e-mailed link', () => {
	const callback = (link: string, cookies = new Map<string, string>()) => {
		const { searchParams } = new URL(link);
		const query = new URLSearchParams({
			email: searchParams.get('email') ?? '',
			token: searchParams.get('token') ?? '',
			callbackUrl: searchParams.get('to') ?? '/sign-in'
		});
		const event = fakeEvent({ path: `/auth/callback/email?${query}`, cookies });
		return authHandle({ event, resolve: () => Promise.reject(new Error('not for Auth.js')) });
	};
	const mails = () => database.db.select().from(mail);
	const linkIn = (text: string) => /https:\S+/.exec(text)?.[0] ?? '';
	const sessionIn = (response: Response) =>
		response.headers.getSetCookie().find((line) => line.startsWith(`${cookie}=`));

	async function mailedLink(form: Record<string, string> = { email }) {
		expect((await askForLink(form)).status).toBe(200);
		const [sent] = await mails();
		return { sent, link: linkIn(sent?.textBody ?? '') };
	}

	it('mails one link, whose button signs in where one wanted to go', async () => {
		const { sent, link } = await mailedLink({ email, to: '/bench?q=1' });
		expect(sent).toMatchObject({ recipient: email });
		expect(sent?.textBody.match(/https:/g)).toHaveLength(1);
		expect(link).toContain(`${origin}/sign-in/link?`);
		const response = await callback(link);
		expect(response.headers.get('location')).toBe(`${origin}/bench?q=1`);
		const line = sessionIn(response) ?? '';
		expect(line).toMatch(/HttpOnly/i);
		expect(line).toMatch(/Secure/i);
		expect(line).toMatch(/SameSite=Lax/i);
		const value = /=([^;]+)/.exec(line)?.[1] ?? '';
		const actor = await readActor(fakeEvent({ path: '/', cookies: new Map([[cookie, value]]) }));
		expect(actor?.id).toBe(who.tester.id);
	});

	it('stores no token in plain, and looking at the page does not use it up', async () => {
		const { link } = await mailedLink();
		const token = new URL(link).searchParams.get('token');
		const [stored] = await database.db.select().from(verificationToken);
		expect(stored?.token).not.toBe(token);
		const data = await loadLink(eventFor({ path: link }));
		expect(data).toMatchObject({ problem: null, email, token });
		expect(sessionIn(await callback(link))).toBeDefined();
	});

	it('works once: a second click, and two at once, are told so', async () => {
		const { link } = await mailedLink();
		const both = await Promise.all([callback(link), callback(link)]);
		expect(both.filter((response) => sessionIn(response))).toHaveLength(1);
		const again = await callback(link);
		expect(sessionIn(again)).toBeUndefined();
		const location = again.headers.get('location') ?? '';
		expect(new URL(location, origin).pathname).toBe('/sign-in/link');
		const data = await loadLink(eventFor({ path: location }));
		expect(data.problem).toMatch(/used already, or more than an hour/);
	});

	it('runs out after an hour', async () => {
		const { link } = await mailedLink();
		const [stored] = await database.db.select().from(verificationToken);
		expect(Math.round(((stored?.expires.getTime() ?? 0) - Date.now()) / 60_000)).toBe(60);
		vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 61 * 60_000 });
		expect(sessionIn(await callback(link))).toBeUndefined();
	});

	it('does not work for another address, nor for somebody who left in between', async () => {
		const { link } = await mailedLink();
		const other = link.replace('tester', 'admin');
		expect(sessionIn(await callback(other))).toBeUndefined();
		await database.db.update(user).set({ leftAt: new Date() }).where(eq(user.id, who.tester.id));
		const response = await callback(link);
		expect(sessionIn(response)).toBeUndefined();
		const data = await loadLink(eventFor({ path: response.headers.get('location') ?? '' }));
		expect(data.problem).toMatch(/can no longer sign in/);
	});

	it('says the same to an address nobody has, sends nothing and adds nobody', async () => {
		const unknown = 'stranger@elsewhere.example';
		const [known, stranger] = await Promise.all([askForLink({ email }), askForLink({ email: unknown })]);
		expect(stranger).toMatchObject({ status: known.status, data: { sentTo: unknown } });
		expect((await mails()).map((sent) => sent.recipient)).toEqual([email]);
		expect(await database.db.select().from(user)).toHaveLength(5);
	});

	it('is limited to five an hour for one address', async () => {
		for (let i = 0; i < 5; i++) expect((await askForLink({ email })).status).toBe(200);
		const { status, data } = await askForLink({ email });
		expect(status).toBe(429);
		expect(messageOf(data)).toMatch(/Try again in 60 minutes/);
		expect(await mails()).toHaveLength(5);
	});

	it('leaves every other door of Auth.js shut', async () => {
		for (const path of [
			'/auth/signin',
			'/auth/signin/email',
			'/auth/session',
			'/auth/providers',
			'/auth/csrf'
		]) {
			const passed = new Response('passed on');
			const event = fakeEvent({ path });
			expect(await authHandle({ event, resolve: () => passed })).toBe(passed);
		}
	});
});
