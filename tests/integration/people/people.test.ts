import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { passwordFits } from '../../../src/lib/server/auth/password';
import { run as runAdmin } from '../../../src/lib/server/cli/admin';
import { auditEvent, invitation, mail, session, user, userRole } from '../../../src/lib/server/db/schema';
import { acceptInvitation, readInvitation } from '../../../src/lib/server/services/people/accept-invitation';
import { askForPasswordLink } from '../../../src/lib/server/services/people/ask-for-password-link';
import { bringBack } from '../../../src/lib/server/services/people/bring-back';
import { changePassword } from '../../../src/lib/server/services/people/change-password';
import { invitePerson } from '../../../src/lib/server/services/people/invite-person';
import { listInvitations } from '../../../src/lib/server/services/people/list-invitations';
import { listPeople } from '../../../src/lib/server/services/people/list-people';
import { markLeft } from '../../../src/lib/server/services/people/mark-left';
import { readPerson } from '../../../src/lib/server/services/people/read-person';
import { readSelf } from '../../../src/lib/server/services/people/read-self';
import { resendInvitation } from '../../../src/lib/server/services/people/resend-invitation';
import { revokeInvitation } from '../../../src/lib/server/services/people/revoke-invitation';
import {
	readPasswordLink,
	setPasswordByLink
} from '../../../src/lib/server/services/people/set-password-by-link';
import { setRoles } from '../../../src/lib/server/services/people/set-roles';
import { signInWithPassword } from '../../../src/lib/server/services/people/sign-in-with-password';
import { signOutEverywhere } from '../../../src/lib/server/services/people/sign-out-everywhere';
import { peopleQuery } from '../../../src/lib/schemas/people';
import { origin } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people, person } from '../../support/people';

const now = new Date('2026-11-11T08:00:00.000Z');
const later = (hours: number) => new Date(now.getTime() + hours * 3_600_000);
let database: TestDatabase;
let who: Record<Role, Actor>;
const as = (role: Role, at = now) => contextFor(database.db, who[role], at);
const visitor = (at = now) => ({ ...contextFor(database.db, who.admin, at), actor: null });
const mails = () => database.db.select().from(mail).orderBy(mail.id);
const linkIn = (text = '') => /https:\S+/.exec(text)?.[0] ?? '';
const lastSegment = (link: string) => link.split('/').at(-1) ?? '';
const rolesHeld = async (id: string) =>
	(await database.db.select().from(userRole).where(eq(userRole.userId, id))).map((row) => row.role);

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

describe('an invitation', () => {
	const input = {
		name: 'Sunniva Brandt',
		email: 'sunniva@northlight.example',
		roles: ['tester', 'writer'] as Role[]
	};
	const accepted = { name: 'Sunniva B.', password: 'a ruler has two edges' };

	async function invited() {
		const sent = await invitePerson(as('admin'), input);
		if (!sent.ok) throw new Error(sent.message);
		const [letter] = await mails();
		return { id: sent.value.id, letter, secret: lastSegment(linkIn(letter?.textBody)) };
	}

	it('goes out by mail with one link, and makes one person with its roles', async () => {
		const { letter, secret } = await invited();
		expect(letter).toMatchObject({
			recipient: input.email,
			subject: 'Adaeze Okoro invites you to Calipress'
		});
		expect(letter?.textBody.match(/https:/g)).toHaveLength(1);
		expect(linkIn(letter?.textBody)).toBe(`${origin}/invite/${secret}`);
		expect(await readInvitation(visitor(), secret)).toMatchObject({
			ok: true,
			value: { email: input.email }
		});
		const outcome = await acceptInvitation(visitor(later(1)), secret, accepted);
		if (!outcome.ok) throw new Error(outcome.message);
		expect(await rolesHeld(outcome.value.userId)).toEqual(['tester', 'writer']);
		const signedIn = await signInWithPassword(
			visitor(),
			{ email: input.email, password: accepted.password },
			'a'
		);
		expect(signedIn).toMatchObject({ ok: true, value: { userId: outcome.value.userId } });
	});

	it('keeps only a hash of its secret', async () => {
		const { secret } = await invited();
		const [row] = await database.db.select().from(invitation);
		expect(row?.tokenHash).toMatch(/^[0-9a-f]{64}$/);
		expect(JSON.stringify(row)).not.toContain(secret);
		expect(JSON.stringify(await database.db.select().from(auditEvent))).not.toContain(secret);
	});

	it('is used once, also by two at the same moment', async () => {
		const { secret } = await invited();
		const both = await Promise.all([1, 2].map(() => acceptInvitation(visitor(), secret, accepted)));
		expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
		expect(both.find((outcome) => !outcome.ok)).toMatchObject({ reason: 'gone' });
		expect(await readInvitation(visitor(), secret)).toMatchObject({
			reason: 'gone',
			message: /used already/
		});
	});

	it('runs out after seven days, and says so', async () => {
		const { secret } = await invited();
		expect(await readInvitation(visitor(later(7 * 24 - 1)), secret)).toMatchObject({ ok: true });
		const late = await acceptInvitation(visitor(later(7 * 24)), secret, accepted);
		expect(late).toMatchObject({
			ok: false,
			reason: 'gone',
			message: expect.stringContaining('has run out')
		});
		expect(await listInvitations(as('admin', later(8 * 24)))).toMatchObject({ value: [{ hasRunOut: true }] });
	});

	it('sent again has a new link and a new week; the old link stops', async () => {
		const { id, secret } = await invited();
		expect(await resendInvitation(as('admin', later(200)), id)).toMatchObject({ ok: true });
		const renewed = lastSegment(linkIn((await mails()).at(-1)?.textBody));
		expect(renewed).not.toBe(secret);
		expect(await acceptInvitation(visitor(later(201)), secret, accepted)).toMatchObject({ reason: 'gone' });
		expect(await acceptInvitation(visitor(later(201)), renewed, accepted)).toMatchObject({ ok: true });
		expect(await resendInvitation(as('admin', later(202)), id)).toMatchObject({ reason: 'not_found' });
	});

	it('taken back works no more', async () => {
		const { id, secret } = await invited();
		expect(await revokeInvitation(as('admin'), id)).toMatchObject({ ok: true });
		const outcome = await acceptInvitation(visitor(), secret, accepted);
		expect(outcome).toMatchObject({ reason: 'gone', message: expect.stringContaining('taken back') });
		expect(await listInvitations(as('admin'))).toMatchObject({ value: [] });
	});

	it('is refused beside the field for an address that is here, or invited already', async () => {
		await invited();
		for (const email of [who.writer.email, input.email]) {
			const outcome = await invitePerson(as('admin'), { ...input, email });
			expect(outcome).toMatchObject({ reason: 'invalid', fields: { email: [expect.any(String)] } });
		}
		expect(await mails()).toHaveLength(1);
	});

	it('whose address came in by another way is refused without half a person', async () => {
		const { secret } = await invited();
		await person(database.db, 'Same address', input.email, ['tester']);
		expect(await acceptInvitation(visitor(), secret, accepted)).toMatchObject({ reason: 'conflict' });
		expect(await database.db.select().from(user).where(eq(user.email, input.email))).toHaveLength(1);
	});
});

describe('roles', () => {
	it('are given and taken, with who and what before in the log', async () => {
		const outcome = await setRoles(as('admin'), who.tester.id, { roles: ['writer', 'editor'], version: 1 });
		expect(outcome).toMatchObject({ ok: true });
		expect(await rolesHeld(who.tester.id)).toEqual(['writer', 'editor']);
		const [entry] = await database.db.select().from(auditEvent);
		expect(entry).toMatchObject({
			act: 'person.roles',
			actorId: who.admin.id,
			before: { roles: ['tester'] },
			after: { roles: ['writer', 'editor'] }
		});
	});

	it('of two admins who save at once are not lost: the second is told', async () => {
		const save = (roles: Role[]) => setRoles(as('admin'), who.tester.id, { roles, version: 1 });
		const both = await Promise.all([save(['writer']), save(['editor'])]);
		expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
		expect(both.find((outcome) => !outcome.ok)).toMatchObject({ reason: 'conflict' });
	});

	it('of the last admin stay, whichever way they would go', async () => {
		const taken = await setRoles(as('admin'), who.admin.id, { roles: ['tester'], version: 1 });
		expect(taken).toMatchObject({
			reason: 'invalid',
			fields: { roles: [expect.stringContaining('last admin')] }
		});
		const left = await markLeft(as('admin'), who.admin.id, { reason: 'moved on', version: 1 });
		expect(left).toMatchObject({ reason: 'invalid' });
		expect(await rolesHeld(who.admin.id)).toEqual(['admin']);
	});

	it('leave one admin when two take each other’s role at once', async () => {
		const second = await person(database.db, 'Second', 'second@northlight.example', ['admin']);
		const take = (from: Actor, by: Actor) =>
			setRoles(contextFor(database.db, by, now), from.id, { roles: [], version: 1 });
		const both = await Promise.all([take(who.admin, second), take(second, who.admin)]);
		expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
		const admins = await database.db.select().from(userRole).where(eq(userRole.role, 'admin'));
		expect(admins).toHaveLength(1);
	});

	it('do not count an admin who has left', async () => {
		const second = await person(database.db, 'Second', 'second@northlight.example', ['admin']);
		expect(await markLeft(as('admin'), second.id, { reason: 'moved on', version: 1 })).toMatchObject({
			ok: true
		});
		expect(await setRoles(as('admin'), who.admin.id, { roles: [], version: 1 })).toMatchObject({
			reason: 'invalid'
		});
	});
});

describe('somebody who leaves', () => {
	it('is signed out, keeps their name, and can be let in again', async () => {
		await database.db
			.insert(session)
			.values({ sessionToken: 'held', userId: who.writer.id, expires: later(100) });
		expect(await markLeft(as('admin'), who.writer.id, { reason: 'moved on', version: 1 })).toMatchObject({
			ok: true
		});
		expect(await database.db.select().from(session)).toHaveLength(0);
		const here = await listPeople(as('tester'), peopleQuery.parse({}));
		expect(here).toMatchObject({ value: { total: 4 } });
		const gone = await listPeople(as('tester'), peopleQuery.parse({ state: 'left' }));
		expect(gone).toMatchObject({ value: { rows: [{ name: who.writer.name }] } });
		expect(await bringBack(as('admin'), who.writer.id, 2)).toMatchObject({ ok: true });
		expect(await readPerson(as('tester'), who.writer.id)).toMatchObject({
			value: { person: { leftAt: null } }
		});
	});
});

describe('the list', () => {
	it('finds by part of a name or address, taking % and _ as they stand, and by role', async () => {
		const found = async (query: object) => {
			const outcome = await listPeople(as('liaison'), peopleQuery.parse(query));
			return outcome.ok ? outcome.value.rows.map((row) => row.email.split('@')[0]) : outcome.reason;
		};
		expect(await found({ q: 'sol' })).toEqual(['editor']);
		expect(await found({ q: '%' })).toEqual([]);
		expect(await found({ role: 'liaison' })).toEqual(['liaison']);
	});
});

describe('a password', () => {
	const ask = (email: string) => askForPasswordLink(visitor(), email, '192.0.2.9');

	it('is reset by a mailed link, once, and other browsers are signed out', async () => {
		await database.db
			.insert(session)
			.values({ sessionToken: 'held', userId: who.tester.id, expires: later(100) });
		await ask(who.tester.email);
		const link = lastSegment(linkIn((await mails())[0]?.textBody));
		expect(await readPasswordLink(visitor(), link)).toMatchObject({ value: { name: who.tester.name } });
		expect(await setPasswordByLink(visitor(later(0.9)), link, 'a ruler has two edges')).toMatchObject({
			ok: true
		});
		expect(await database.db.select().from(session)).toHaveLength(0);
		const [row] = await database.db.select().from(user).where(eq(user.id, who.tester.id));
		expect(row?.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
		expect(await passwordFits(row?.passwordHash, 'a ruler has two edges')).toBe(true);
		expect(await setPasswordByLink(visitor(), link, 'another long password')).toMatchObject({
			reason: 'gone'
		});
	});

	it('link runs out after an hour, gives way to a newer one, and is of no use when bent', async () => {
		await ask(who.tester.email);
		await ask(who.tester.email);
		const [first, second] = (await mails()).map(({ textBody }) => lastSegment(linkIn(textBody)));
		expect(await readPasswordLink(visitor(), first ?? '')).toMatchObject({ reason: 'gone' });
		expect(await readPasswordLink(visitor(later(1)), second ?? '')).toMatchObject({ reason: 'gone' });
		for (const bent of ['', 'x', `${who.admin.id}.${second?.split('.')[1]}`, `${second}x`])
			expect(await setPasswordByLink(visitor(), bent, 'a ruler has two edges')).toMatchObject({
				reason: 'gone'
			});
	});

	it('link is mailed to nobody unknown, and to nobody who has left', async () => {
		await database.db.update(user).set({ leftAt: now }).where(eq(user.id, who.tester.id));
		expect(await ask('stranger@elsewhere.example')).toEqual(await ask(who.tester.email));
		expect(await mails()).toHaveLength(0);
	});

	it('changes only with the one before, and keeps this browser', async () => {
		const ctx = as('tester');
		await ask(who.tester.email);
		const link = lastSegment(linkIn((await mails())[0]?.textBody));
		await setPasswordByLink(visitor(), link, 'a ruler has two edges');
		const held = ['this', 'other'].map((sessionToken) => ({
			sessionToken,
			userId: who.tester.id,
			expires: later(9)
		}));
		await database.db.insert(session).values(held);
		const from = { address: '192.0.2.9', sessionToken: 'this' };
		const wrong = await changePassword(ctx, { current: 'not it', password: 'ink dries on paper' }, from);
		expect(wrong).toMatchObject({ reason: 'invalid', fields: { current: [expect.any(String)] } });
		const right = { current: 'a ruler has two edges', password: 'ink dries on paper' };
		expect(await changePassword(ctx, right, from)).toMatchObject({ ok: true });
		expect((await database.db.select().from(session)).map((row) => row.sessionToken)).toEqual(['this']);
		expect(await readSelf(ctx)).toMatchObject({ value: { browsers: 1, hasPassword: true } });
		expect(await signOutEverywhere(ctx)).toMatchObject({ ok: true });
		expect(await database.db.select().from(session)).toHaveLength(0);
	});
});

describe('the first admin', () => {
	const tools = (lines: string[]) => ({
		db: database.db,
		now,
		origin,
		print: (line: string) => void lines.push(line)
	});

	it('is made on the command line with a link to set a password', async () => {
		const lines: string[] = [];
		expect(await runAdmin(['New.Admin@northlight.example'], tools(lines))).toBe(0);
		const link = lastSegment(lines.at(-1) ?? '');
		const outcome = await setPasswordByLink(visitor(later(23)), link, 'a ruler has two edges');
		if (!outcome.ok) throw new Error(outcome.message);
		expect(await rolesHeld(outcome.value.userId)).toEqual(['admin']);
	});

	it('may be somebody who is here, and even who had left; a wrong address makes nobody', async () => {
		await database.db.update(user).set({ leftAt: now }).where(eq(user.id, who.writer.id));
		expect(await runAdmin([who.writer.email], tools([]))).toBe(0);
		expect(await rolesHeld(who.writer.id)).toEqual(['writer', 'admin']);
		const lines: string[] = [];
		expect(await runAdmin(['not an address'], tools(lines))).toBe(2);
		expect(await runAdmin([], tools(lines))).toBe(2);
		expect(lines.join('\n')).toContain('Usage: npm run admin -- EMAIL');
		expect(await database.db.select().from(user)).toHaveLength(5);
	});
});
