import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { eq } from 'drizzle-orm';
import {
	cellSignature,
	edition,
	embargo,
	job,
	loan,
	loanSample,
	partner,
	run,
	setting
} from '../../../src/lib/server/db/schema';
import { runDue } from '../../../src/lib/server/jobs/runner';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { publishArticle } from '../../../src/lib/server/services/articles/publish-article';
import { readReview } from '../../../src/lib/server/services/articles/read-review';
import {
	scheduleArticle,
	unscheduleArticle
} from '../../../src/lib/server/services/articles/schedule-article';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { outbox, rowOf, slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign, sourceOf, type MeasuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
let measured: MeasuredCampaign;
const now = new Date('2026-11-11T08:00:00.000Z');
/** Saturday 14 November, 15:00 in Oslo (CET, UTC+1). */
const slot = '2026-11-14T15:00';
const slotAt = new Date('2026-11-14T14:00:00.000Z');
const as = (role: keyof People, at = now) => contextFor(database.db, who[role], at);
const row = () => rowOf(database.db, slug);
const version = () => versionOf(database.db, slug);
const system = (at: Date) => ({ db: database.db, now: at, origin: 'https://northlight.example' });
const tools = { deliver: () => Promise.resolve() };
const schedule = async (local = slot) =>
	scheduleArticle(as('editor'), slug, { version: await version(), slot: local });
const publications = async () =>
	(await outbox(database.db)).filter((line) => line.endsWith(`: Published: ${title}`));

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
	const value = { name: 'Northlight Hardware', zone: 'Europe/Oslo', tagline: '' };
	await database.db.insert(setting).values({ key: 'publication', value });
});

async function approved({ lent = false, source = sourceOf() } = {}) {
	const { db } = database;
	measured = await measuredCampaign(db, who.tester, { provenance: lent ? 'loaned' : 'bought' });
	if (lent) await agree('Lent by its maker until December.');
	await writtenArticle(db, who.writer, { source });
	wanted(await submitArticle(as('writer'), slug, { version: await version() }));
	wanted(await approveArticle(as('editor'), slug, { version: await version() }));
}

async function agree(disclosure: string) {
	const { db } = database;
	const at = { createdAt: now };
	const [made] = await db
		.insert(partner)
		.values({ slug: 'aldermoor', name: 'Aldermoor', notes: '', ...at })
		.$returningId();
	const [lent] = await db
		.insert(loan)
		.values({
			partnerId: made?.id ?? 0,
			stage: 'here',
			terms: '',
			disclosure,
			createdBy: who.liaison.id,
			...at
		})
		.$returningId();
	await db.insert(loanSample).values({ loanId: lent?.id ?? 0, sampleId: measured.sampleId });
}

const embargoUntil = (until: string) =>
	database.db.insert(embargo).values({
		sampleId: measured.sampleId,
		field: 'everything',
		until: new Date(until),
		note: '',
		createdAt: now
	});

describe('a slot', () => {
	it('is read in the publication’s zone, and queues the publication for that moment', async () => {
		await approved();
		expect(wanted(await schedule())).toMatchObject({ stage: 'scheduled', slotAt });
		const queued = await database.db.select().from(job).where(eq(job.kind, 'publish-article'));
		expect(queued).toMatchObject([{ runAt: slotAt, payload: { articleId: (await row()).id } }]);
		expect((await outbox(database.db)).slice(-2)).toEqual([
			`writer: Scheduled: ${title}`,
			`tester: Scheduled: ${title}`
		]);
	});

	it('is refused where the clocks skip it, and where it has passed', async () => {
		await approved();
		// Oslo's clocks go from 02:00 to 03:00 on 28 March 2027 (IANA tzdata, rule EU: last Sunday of March).
		expect(await schedule('2027-03-28T02:30')).toMatchObject({
			ok: false,
			reason: 'invalid',
			fields: { slot: [expect.stringContaining('does not exist')] }
		});
		expect(await schedule('2026-11-11T08:30')).toMatchObject({
			ok: false,
			fields: { slot: [expect.stringContaining('has passed')] }
		});
		expect((await row()).stage).toBe('approved');
	});

	it('is refused before an embargo ends, and taken from the moment it ends', async () => {
		await approved({ lent: true, source: sourceOf('aldermoor-1650-first-look', '\n::disclosure\n') });
		await embargoUntil('2026-11-14T14:00:00.000Z');
		const early = await schedule('2026-11-14T14:59');
		expect(early).toMatchObject({ ok: false, reason: 'invalid' });
		expect(!early.ok && early.message).toContain('Saturday 14 November 2026, 15:00 (CET)');
		wanted(await schedule());
	});

	it('goes out once, however many processes look for work', async () => {
		await approved();
		wanted(await schedule());
		expect(await runDue(system(new Date(slotAt.getTime() - 1)), { tools })).toBeGreaterThan(0);
		expect((await row()).stage).toBe('scheduled');
		const at = new Date(slotAt.getTime() + 400);
		await Promise.all(Array.from({ length: 4 }, () => runDue(system(at), { tools })));
		await runDue(system(new Date(at.getTime() + 60_000)), { tools });
		expect(await row()).toMatchObject({ stage: 'published', firstPublishedAt: at });
		const editions = await database.db.select().from(edition);
		expect(editions).toMatchObject([{ publishedAt: at }]);
		expect(await publications()).toEqual([`writer: Published: ${title}`, `tester: Published: ${title}`]);
	});

	it('that was given up, or moved, does nothing at the old time', async () => {
		await approved();
		wanted(await schedule());
		wanted(await unscheduleArticle(as('editor'), slug, { version: await version() }));
		await runDue(system(slotAt), { tools });
		expect((await row()).stage).toBe('approved');
		const later = '2026-11-15T15:00';
		wanted(await scheduleArticle(as('editor', slotAt), slug, { version: await version(), slot: later }));
		await runDue(system(slotAt), { tools });
		expect((await row()).stage).toBe('scheduled');
		await runDue(system(new Date('2026-11-15T14:00:00.000Z')), { tools });
		expect((await row()).stage).toBe('published');
	});

	it('stops at an embargo that moved, prints nothing, and tells the editors and the author why', async () => {
		await approved({ lent: true, source: sourceOf('aldermoor-1650-first-look', '\n::disclosure\n') });
		wanted(await schedule());
		await embargoUntil('2026-11-20T08:00:00.000Z');
		await runDue(system(slotAt), { tools });
		expect(await row()).toMatchObject({ stage: 'approved', slotAt: null, firstPublishedAt: null });
		expect((await outbox(database.db)).slice(-2)).toEqual([
			`editor: Not published: ${title}`,
			`writer: Not published: ${title}`
		]);
	});
});

describe('publishing now', () => {
	it('is refused under a standing embargo and without an agreed disclosure, and says why', async () => {
		await approved();
		await embargoUntil('2026-11-12T08:00:00.000Z');
		const held = await publishArticle(as('editor'), slug, { version: await version() });
		expect(held).toMatchObject({ ok: false, reason: 'invalid' });
		expect(!held.ok && held.message).toContain('embargo on Aldermoor 1650');
	});

	it('tells the liaison title and link of an article with a lent sample, and nothing of the text', async () => {
		await approved({ lent: true, source: sourceOf('aldermoor-1650-first-look', '\n::disclosure\n') });
		wanted(await publishArticle(as('editor'), slug, { version: await version() }));
		expect((await outbox(database.db)).slice(-3)).toEqual([
			`writer: Published: ${title}`,
			`tester: Published: ${title}`,
			`liaison: Published: ${title}`
		]);
	});

	it('prints what was approved, whatever the bench did meanwhile', async () => {
		const { db } = database;
		await approved();
		const [before] = await db.select().from(edition);
		await db
			.update(run)
			.set({ voidedAt: now, voidedBy: who.tester.id, voidReason: 'fan was off' })
			.where(eq(run.id, measured.runs['fixed-495']));
		await db.update(cellSignature).set({ removedAt: now, removedReason: 'a run was voided' });
		wanted(await publishArticle(as('editor'), slug, { version: await version() }));
		const [after] = await db.select().from(edition);
		expect(after?.page).toBe(before?.page);
		expect(after?.hash).toBe(before?.hash);
		const review = wanted(await readReview(as('editor'), slug));
		expect(review.shown).toMatchObject({ benchMoved: true, html: before?.page });
	});
});

describe('a lent sample', () => {
	it('without a disclosure in the text, or without words agreed, stops the approval', async () => {
		const { db } = database;
		measured = await measuredCampaign(db, who.tester, { provenance: 'loaned' });
		await writtenArticle(db, who.writer);
		wanted(await submitArticle(as('writer'), slug, { version: await version() }));
		const bare = await approveArticle(as('editor'), slug, { version: await version() });
		expect(!bare.ok && bare.message).toContain('has no disclosure');
		expect(!bare.ok && bare.message).toContain('No disclosure text is agreed');
	});
});
