import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { inject } from 'vitest';
import * as jobs from '../../../src/lib/server/db/queries/jobs';
import { job, mail } from '../../../src/lib/server/db/schema';
import type { JobHandler } from '../../../src/lib/server/jobs/handler';
import { openMailer } from '../../../src/lib/server/jobs/mailer';
import { post } from '../../../src/lib/server/jobs/outbox';
import { enqueue } from '../../../src/lib/server/jobs/queue';
import { queueRecurring, runDue } from '../../../src/lib/server/jobs/runner';
import { openDatabase } from '../../../src/lib/server/db/client';
import { migrateDatabase } from '../../../src/lib/server/migrate';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { forgetMail, receivedMail } from '../../support/mail';

let database: TestDatabase;
const now = new Date('2026-11-11T08:00:00.000Z');
const later = (ms: number) => new Date(now.getTime() + ms);
const ctx = (at = now) => ({ db: database.db, now: at, origin: 'https://northlight.example' });
const noMail = { deliver: () => Promise.reject(new Error('no mail here')) };
const letter = (n: number) => ({
	messageId: `test-${n}@calipress`,
	recipient: 'reader@northlight.example',
	subject: `Letter ${n}`,
	textBody: 'Words.',
	htmlBody: '<p>Words.</p>'
});

beforeAll(async () => {
	database = await testDatabase();
});
beforeEach(() => emptyTables(database));
afterAll(() => database.close());

describe('the job runner', () => {
	it('does each of 400 jobs once with two processes on one database', async () => {
		const other = openDatabase(database.url);
		const done: number[] = [];
		const handlers: Record<string, JobHandler> = {
			count: (_ctx, { n }) => Promise.resolve(void done.push(Number(n)))
		};
		await enqueue(
			database.db,
			now,
			Array.from({ length: 400 }, (_, n) => ({ kind: 'count', payload: { n }, runAt: now }))
		);
		const [mine, theirs] = await Promise.all([
			runDue(ctx(), { tools: noMail, handlers }),
			runDue({ ...ctx(), db: other.db }, { tools: noMail, handlers })
		]);
		await other.pool.end();
		expect(mine + theirs).toBe(400);
		expect(new Set(done).size).toBe(400);
		expect(done).toHaveLength(400);
	});

	it('gives the work of a killed process to another when its lease ends, and not before', async () => {
		await enqueue(database.db, now, [{ kind: 'count', payload: {}, runAt: now }]);
		const dead = await jobs.claim(database.db, now, { name: 'killed', until: later(60_000), limit: 1 });
		expect(dead).toHaveLength(1);
		let ran = 0;
		const handlers = { count: () => Promise.resolve(void ran++) };
		expect(await runDue(ctx(later(59_000)), { tools: noMail, handlers })).toBe(0);
		expect(await runDue(ctx(later(60_001)), { tools: noMail, handlers })).toBe(1);
		expect(ran).toBe(1);
		// The killed one wakes after all: its lease is gone, so it can neither finish nor fail the job.
		await Promise.all(
			dead.map((one) => jobs.fail(database.db, one, 'killed', { runAt: now, error: 'late', now }))
		);
		expect(await database.db.select({ state: job.state }).from(job)).toEqual([{ state: 'done' }]);
	});

	it('tries a failing job again later and later, then gives it up where an admin sees it', async () => {
		await enqueue(database.db, now, [{ kind: 'fail', payload: {}, runAt: now }]);
		await database.db.update(job).set({ maxAttempts: 3 });
		const handlers = { fail: () => Promise.reject(new Error('the disk is full')) };
		const work = { tools: noMail, handlers, jitter: () => 0 };
		expect(await runDue(ctx(), work)).toBe(1);
		expect(await runDue(ctx(later(4_999)), work)).toBe(0);
		expect(await runDue(ctx(later(5_000)), work)).toBe(1);
		expect(await runDue(ctx(later(15_000)), work)).toBe(1);
		expect(await runDue(ctx(later(86_400_000)), work)).toBe(0);
		expect(
			await database.db.select({ state: job.state, error: job.lastError, attempts: job.attempts }).from(job)
		).toEqual([{ state: 'dead', error: 'Error: the disk is full', attempts: 3 }]);
		expect(await jobs.countDead(database.db)).toBe(1);
	});

	it('gives up what ended its process at every attempt, instead of trying it for ever', async () => {
		await enqueue(database.db, now, [{ kind: 'count', payload: {}, runAt: now }]);
		await database.db.update(job).set({ attempts: 8, maxAttempts: 8, leasedBy: 'killed', leasedUntil: now });
		let ran = 0;
		const handlers = { count: () => Promise.resolve(void ran++) };
		expect(await runDue(ctx(later(1)), { tools: noMail, handlers })).toBe(1);
		expect(ran).toBe(0);
		expect(await jobs.countDead(database.db)).toBe(1);
	});

	it('leaves what has a later time alone until that time', async () => {
		await enqueue(database.db, now, [{ kind: 'count', payload: {}, runAt: later(1000) }]);
		const handlers = { count: () => Promise.resolve() };
		expect(await runDue(ctx(later(999)), { tools: noMail, handlers })).toBe(0);
		expect(await jobs.nextDue(database.db)).toEqual(later(1000));
		expect(await runDue(ctx(later(1000)), { tools: noMail, handlers })).toBe(1);
	});

	it('queues a recurring job once for its period, whoever asks', async () => {
		await Promise.all([queueRecurring(ctx()), queueRecurring(ctx(later(1000)))]);
		const kinds = await database.db.select({ kind: job.kind }).from(job).orderBy(asc(job.kind));
		expect(kinds.map((row) => row.kind)).toEqual(['loan-reminders', 'sweep']);
		await queueRecurring(ctx(later(3_600_000)));
		expect(
			await database.db.select({ id: job.id }).from(job).where(eq(job.kind, 'loan-reminders'))
		).toHaveLength(2);
	});
});

describe('the outbox', () => {
	it('sends each mail once over real SMTP, and the same event is written once', async () => {
		await forgetMail();
		const mailer = openMailer(inject('smtpUrl'), 'Northlight <desk@northlight.example>');
		await post(database.db, now, [letter(1), letter(2)]);
		await post(database.db, now, [letter(1)]);
		await Promise.all([runDue(ctx(), { tools: mailer }), runDue(ctx(), { tools: mailer })]);
		// Somebody puts the jobs back in the queue: what was sent stays sent.
		await database.db.update(job).set({ state: 'waiting', leasedUntil: null });
		await runDue(ctx(later(1)), { tools: mailer });
		mailer.close();
		const received = await receivedMail();
		expect(received.map((one) => one.subject).sort()).toEqual(['Letter 1', 'Letter 2']);
		expect(received[0]?.to[0]?.address).toBe('reader@northlight.example');
		expect(await database.db.select({ sentAt: mail.sentAt }).from(mail)).toEqual([
			{ sentAt: now },
			{ sentAt: now }
		]);
	});

	it('keeps a mail while the server is away, and sends it when it is back', async () => {
		await forgetMail();
		await post(database.db, now, [letter(3)]);
		const away = openMailer('smtp://127.0.0.1:9', 'desk@northlight.example');
		await runDue(ctx(), { tools: away, jitter: () => 0 });
		away.close();
		expect(await receivedMail()).toEqual([]);
		const back = openMailer(inject('smtpUrl'), 'desk@northlight.example');
		await runDue(ctx(later(5_000)), { tools: back });
		back.close();
		expect((await receivedMail()).map((one) => one.subject)).toEqual(['Letter 3']);
	});
});

describe('migrations', () => {
	it('are safe when two processes start together, and again when nothing is left to do', async () => {
		await Promise.all([migrateDatabase(database.url), migrateDatabase(database.url)]);
		await migrateDatabase(database.url);
		expect(await database.db.select().from(job)).toEqual([]);
	});
});
