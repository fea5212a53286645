import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { asc } from 'drizzle-orm';
import { revision } from '../../../src/lib/server/db/schema';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { restoreRevision } from '../../../src/lib/server/services/articles/restore-revision';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { startArticle } from '../../../src/lib/server/services/articles/start-article';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { articleStart } from '../../../src/lib/schemas/article';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { outbox, rowOf, slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
const now = new Date('2026-11-11T08:00:00.000Z');
const as = (role: keyof People) => contextFor(database.db, who[role], now);
const text = (source: string, basedOn: number) => ({ title, standfirst: '', source, basedOn });

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
	await measuredCampaign(database.db, who.tester);
	await writtenArticle(database.db, who.writer);
});

describe('saving', () => {
	it('makes a revision of each change and none of the same text', async () => {
		const first = wanted(await saveRevision(as('writer'), slug, text('one', 2)));
		expect(first).toMatchObject({ revision: 3, changed: true });
		expect(wanted(await saveRevision(as('writer'), slug, text('one', 3)))).toMatchObject({
			revision: 3,
			changed: false
		});
		// Also when the answer to the first save got lost and the same text comes again on the old base.
		expect(wanted(await saveRevision(as('writer'), slug, text('one', 2)))).toMatchObject({ changed: false });
		expect((await rowOf(database.db, slug)).head).toBe(3);
	});

	it('refuses a text over somebody else’s newer revision, and hands that over', async () => {
		wanted(await saveRevision(as('editor'), slug, text('the editor’s', 2)));
		const refused = await saveRevision(as('writer'), slug, text('the writer’s', 2));
		expect(refused).toMatchObject({
			ok: false,
			reason: 'conflict',
			detail: { number: 3, source: 'the editor’s', savedByName: who.editor.name }
		});
		// Kept as a new revision over theirs, both texts stay.
		wanted(await saveRevision(as('writer'), slug, text('the writer’s', 3)));
		const sources = await database.db
			.select({ source: revision.source })
			.from(revision)
			.orderBy(asc(revision.number));
		expect(sources.slice(2).map((row) => row.source)).toEqual(['the editor’s', 'the writer’s']);
	});

	it('loses nothing when eight people save at once: one wins, seven are told', async () => {
		const outcomes = await Promise.all(
			Array.from({ length: 8 }, (_, index) =>
				saveRevision(as(index % 2 ? 'editor' : 'writer'), slug, text(`text ${index}`, 2))
			)
		);
		expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
		expect(outcomes.filter((outcome) => !outcome.ok && outcome.reason === 'conflict')).toHaveLength(7);
		expect((await rowOf(database.db, slug)).head).toBe(3);
	});

	it('brings an old revision back as the newest', async () => {
		wanted(await saveRevision(as('writer'), slug, text('spoiled', 2)));
		wanted(await restoreRevision(as('editor'), slug, { number: 2, basedOn: 3 }));
		const rows = await database.db.select().from(revision).orderBy(asc(revision.number));
		expect(rows).toHaveLength(4);
		expect(rows[3]?.source).toBe(rows[1]?.source);
		expect(rows[3]?.note).toBe('restored from revision 2');
	});

	it('is for the author and the editors', async () => {
		for (const role of ['tester', 'liaison', 'admin'] as const)
			expect(await saveRevision(as(role), slug, text('x', 2))).toMatchObject({
				ok: false,
				reason: 'forbidden'
			});
	});

	it('takes the approval off an approved article, and tells the author and whoever approved', async () => {
		const { db } = database;
		wanted(await submitArticle(as('writer'), slug, { version: await versionOf(db, slug) }));
		wanted(await approveArticle(as('editor'), slug, { version: await versionOf(db, slug) }));
		const saved = wanted(await saveRevision(as('writer'), slug, text('one more thing', 2)));
		expect(saved).toMatchObject({ approvalTakenOff: true, stage: 'in-review' });
		expect(await rowOf(db, slug)).toMatchObject({ stage: 'in-review', approvedEditionId: null });
		expect((await outbox(db)).at(-1)).toBe(`editor: Back in review: ${title}`);
	});
});

describe('starting', () => {
	it('refuses a title that makes the address of another article, beside the field', async () => {
		const again = await startArticle(
			as('writer'),
			articleStart.parse({
				title: 'Brisk, against Pennon!',
				template: 'short-note',
				campaigns: ['aldermoor-1650-first-look']
			})
		);
		expect(again).toMatchObject({ ok: false, reason: 'conflict', fields: { title: [expect.any(String)] } });
	});

	it('fills the template in with the names of the campaign', async () => {
		const [first] = await database.db.select().from(revision).orderBy(asc(revision.number)).limit(1);
		expect(first?.source).toContain('::plate{kind=gains over=stock');
		expect(first?.source).not.toContain('{{');
	});

	it('is for writers and editors, and for campaigns that exist', async () => {
		const input = articleStart.parse({
			title: 'Another one',
			template: 'short-note',
			campaigns: ['nowhere']
		});
		expect(await startArticle(as('tester'), input)).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(await startArticle(as('writer'), input)).toMatchObject({
			ok: false,
			reason: 'invalid',
			fields: { campaigns: [expect.any(String)] }
		});
	});
});
