import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Actor, Role } from '../../../src/lib/domain/people/roles';
import { auditEvent, job } from '../../../src/lib/server/db/schema';
import { bringBack } from '../../../src/lib/server/services/people/bring-back';
import { dropJob } from '../../../src/lib/server/services/people/drop-job';
import { invitePerson } from '../../../src/lib/server/services/people/invite-person';
import { listAudit } from '../../../src/lib/server/services/people/list-audit';
import { listDeadJobs } from '../../../src/lib/server/services/people/list-dead-jobs';
import { listInvitations } from '../../../src/lib/server/services/people/list-invitations';
import { markLeft } from '../../../src/lib/server/services/people/mark-left';
import { readSettings } from '../../../src/lib/server/services/people/read-settings';
import { renameSelf } from '../../../src/lib/server/services/people/rename-self';
import { resendInvitation } from '../../../src/lib/server/services/people/resend-invitation';
import { retryJob } from '../../../src/lib/server/services/people/retry-job';
import { revokeInvitation } from '../../../src/lib/server/services/people/revoke-invitation';
import { savePublication } from '../../../src/lib/server/services/people/save-publication';
import { setRoles } from '../../../src/lib/server/services/people/set-roles';
import { auditQuery, publicationInput } from '../../../src/lib/schemas/people';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';

const now = new Date('2026-11-11T08:00:00.000Z');
let database: TestDatabase;
let who: Record<Role, Actor>;
const as = (role: Role, at = now) => contextFor(database.db, who[role], at);

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

describe('settings, stuck jobs and the log', () => {
	it('take only a time zone there is, and refuse a save over a newer one', async () => {
		const input = { name: 'Northlight Hardware', zone: 'Europe/Oslo', tagline: '', version: 0 };
		for (const zone of ['Mars/Olympus', '+02:00', '', 'Europe/Oslo; drop'])
			expect(publicationInput.safeParse({ ...input, zone }).success, zone).toBe(false);
		const save = (name: string, version: number) => savePublication(as('admin'), { ...input, name, version });
		const both = await Promise.all([save('One', 0), save('Two', 0)]);
		expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
		expect(await save('Three', 1)).toMatchObject({ ok: true });
		expect(await save('Four', 1)).toMatchObject({ reason: 'conflict' });
		expect(await readSettings(as('admin'))).toMatchObject({ value: { name: 'Three', version: 2 } });
	});

	it('show a dead letter with whom it is for, try it again, and drop it with a reason', async () => {
		await invitePerson(as('admin'), { name: 'S', email: 's@northlight.example', roles: ['tester'] });
		await database.db.update(job).set({ state: 'dead', attempts: 8, lastError: 'refused', finishedAt: now });
		const listed = await listDeadJobs(as('admin'), 1);
		expect(listed).toMatchObject({
			value: { rows: [{ attempts: 8, mail: { recipient: 's@northlight.example' } }] }
		});
		const id = listed.ok ? (listed.value.rows[0]?.id ?? 0) : 0;
		expect(await retryJob(as('admin'), id)).toMatchObject({ ok: true });
		expect(await database.db.select().from(job)).toMatchObject([
			{ state: 'waiting', attempts: 0, finishedAt: null }
		]);
		expect(await dropJob(as('admin'), { id, reason: 'gone' })).toMatchObject({ reason: 'not_found' });
		await database.db.update(job).set({ state: 'dead' });
		expect(await dropJob(as('admin'), { id, reason: 'the address is gone' })).toMatchObject({ ok: true });
		expect(await database.db.select().from(job)).toMatchObject([{ state: 'dropped' }]);
		const [entry] = await database.db.select().from(auditEvent).where(eq(auditEvent.act, 'job.drop'));
		expect(entry?.reason).toBe('the address is gone');
	});

	it('can be read by person, kind, act and day of the publication’s zone, page by page', async () => {
		await savePublication(as('admin'), { name: 'N', zone: 'Europe/Oslo', tagline: '', version: 0 });
		// 23:30 UTC on the 10th is the 11th in Oslo.
		const at = new Date('2026-11-10T23:30:00Z');
		const entry = { at, actorId: who.tester.id, act: 'run.record', subjectKind: 'run', subjectId: '1' };
		await database.db
			.insert(auditEvent)
			.values(Array.from({ length: 120 }, (_, i) => ({ ...entry, subjectId: `${i}` })));
		const read = async (query: object) => {
			const outcome = await listAudit(as('admin'), auditQuery.parse(query));
			if (!outcome.ok) throw new Error(outcome.message);
			return outcome.value;
		};
		expect(
			(await read({ who: who.tester.id, from: '2026-11-11', until: '2026-11-11' })).entries
		).toHaveLength(50);
		expect((await read({ who: who.tester.id, until: '2026-11-10' })).entries).toHaveLength(0);
		expect((await read({ act: 'run', kind: 'run', id: '7' })).entries).toHaveLength(1);
		const seen = new Set<number>();
		let before: number | undefined;
		for (let page = 0; page < 3; page++) {
			const { entries, older } = await read({ kind: 'run', before });
			for (const { id } of entries) seen.add(id);
			before = older;
		}
		expect(seen.size).toBe(120);
		expect(before).toBeUndefined();
	});
});

describe('what only an admin does', () => {
	it('is refused to everybody else, and to an admin’s token', async () => {
		const scripted = { ...who.admin, scopes: ['bench:write' as const] };
		const others = [who.tester, who.writer, who.editor, who.liaison, scripted];
		for (const actor of others) {
			const ctx = contextFor(database.db, actor, now);
			const outcomes = await Promise.all([
				invitePerson(ctx, { name: 'S', email: 's@northlight.example', roles: ['admin'] }),
				setRoles(ctx, actor.id, { roles: ['admin'], version: 1 }),
				markLeft(ctx, who.writer.id, { reason: 'x', version: 1 }),
				bringBack(ctx, who.writer.id, 1),
				listInvitations(ctx),
				resendInvitation(ctx, 1),
				revokeInvitation(ctx, 1),
				listDeadJobs(ctx, 1),
				retryJob(ctx, 1),
				dropJob(ctx, { id: 1, reason: 'x' }),
				listAudit(ctx, auditQuery.parse({})),
				readSettings(ctx),
				savePublication(ctx, { name: 'N', zone: 'UTC', tagline: '', version: 0 })
			]);
			for (const outcome of outcomes) expect(outcome).toMatchObject({ ok: false, reason: 'forbidden' });
		}
		expect(await renameSelf({ ...as('admin'), actor: scripted }, { name: 'X', version: 1 })).toMatchObject({
			reason: 'forbidden'
		});
	});
});
