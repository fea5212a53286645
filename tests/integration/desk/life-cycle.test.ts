import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { commentInput, commentResolve, correctionInput } from '../../../src/lib/schemas/article';
import { edition, editionPart, editionResult, plate } from '../../../src/lib/server/db/schema';
import { eq } from 'drizzle-orm';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { askChanges } from '../../../src/lib/server/services/articles/ask-changes';
import {
	commentOnArticle,
	resolveComment
} from '../../../src/lib/server/services/articles/comment-on-article';
import { correctArticle } from '../../../src/lib/server/services/articles/correct-article';
import { publishArticle } from '../../../src/lib/server/services/articles/publish-article';
import { readReview } from '../../../src/lib/server/services/articles/read-review';
import { keepAsPrinted, reviseArticle } from '../../../src/lib/server/services/articles/revise-article';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { withdrawArticle } from '../../../src/lib/server/services/articles/withdraw-article';
import { ofArticle as correctionsOf } from '../../../src/lib/server/db/queries/correction';
import { ofSubject } from '../../../src/lib/server/db/queries/audit';
import {
	listArticles,
	listParts,
	readArticle,
	readPlate
} from '../../../src/lib/server/services/reader/published-pages';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people, person } from '../../support/people';
import { outbox, rowOf, slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign, sourceOf } from './measured-campaign';

let database: TestDatabase;
let who: People;
const now = new Date('2026-11-11T08:00:00.000Z');
const as = (role: keyof People, at = now) => contextFor(database.db, who[role], at);
const version = () => versionOf(database.db, slug);
const row = () => rowOf(database.db, slug);

beforeAll(async () => {
	database = await testDatabase();
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

const submit = async () => wanted(await submitArticle(as('writer'), slug, { version: await version() }));
const approve = async () => wanted(await approveArticle(as('editor'), slug, { version: await version() }));
const publish = async (at = now) =>
	wanted(await publishArticle(as('editor', at), slug, { version: await version() }));

describe('an article from empty to print', () => {
	it('walks drafting, review, changes, review, approval and print, and tells those it concerns once', async () => {
		const { db } = database;
		await measuredCampaign(db, who.tester);
		await writtenArticle(db, who.writer);
		expect((await row()).stage).toBe('drafting');
		await submit();
		expect((await row()).stage).toBe('in-review');
		const asked = await askChanges(as('editor'), slug, {
			version: await version(),
			words: 'Say on what it ran.'
		});
		expect(wanted(asked).stage).toBe('changes-asked');
		await submit();
		await approve();
		expect(await row()).toMatchObject({ stage: 'approved' });
		await publish();
		expect(await row()).toMatchObject({ stage: 'published', firstPublishedAt: now, slotAt: null });
		expect(await outbox(db)).toEqual([
			`editor: For review: ${title}`,
			`writer: Changes asked: ${title}`,
			`editor: For review: ${title}`,
			`writer: Approved: ${title}`,
			`writer: Published: ${title}`,
			`tester: Published: ${title}`
		]);
		const log = await ofSubject(db, 'article', (await row()).id);
		expect(log.map((one) => one.act).reverse()).toEqual([
			'article.start',
			'article.submit',
			'article.ask-changes',
			'article.submit',
			'article.approve',
			'article.publish'
		]);
	});

	it('freezes page, plates, results, parts and testers with the edition', async () => {
		const { db } = database;
		await measuredCampaign(db, who.tester);
		await writtenArticle(db, who.writer);
		await submit();
		await approve();
		const [frozen] = await db.select().from(edition);
		// The mean of 31.1, 31.3, 31.2, 31.2, 31.2 is 31.2; 35.1 ÷ 31.2 = 1.125 exactly: +12.5 % (worked by hand).
		// Its 95 % half width is 0.088, so three decimals are printed (JCGM 100:2008, 7.2.6).
		expect(frozen?.page).toContain('>31.200&nbsp;s<');
		expect(frozen?.page).toContain('+12.5');
		expect(frozen?.hash).toMatch(/^[0-9a-f]{64}$/);
		expect(frozen).toMatchObject({ number: 1, testerNames: [who.tester.name], authorName: who.writer.name });
		expect(await db.select().from(plate)).toHaveLength(1);
		expect(await db.select().from(editionResult)).toHaveLength(2);
		expect(await db.select().from(editionPart)).toHaveLength(1);
	});

	it('is refused out of turn, over a version nobody sees any more, and to those who may not', async () => {
		const { db } = database;
		await measuredCampaign(db, who.tester);
		await writtenArticle(db, who.writer);
		expect(await publishArticle(as('editor'), slug, { version: await version() })).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		await submit();
		expect(await approveArticle(as('editor'), slug, { version: 1 })).toMatchObject({
			ok: false,
			reason: 'conflict'
		});
		for (const role of ['writer', 'tester', 'liaison', 'admin'] as const)
			expect(await approveArticle(as(role), slug, { version: await version() })).toMatchObject({
				ok: false,
				reason: 'forbidden'
			});
		expect((await row()).stage).toBe('in-review');
		expect(await readReview(as('liaison'), slug)).toMatchObject({ ok: false, reason: 'forbidden' });
	});

	it('is never approved by its author, editor or not', async () => {
		const { db } = database;
		const both = await person(db, 'Edda Lund', 'edda@northlight.example', ['writer', 'editor']);
		await measuredCampaign(db, who.tester);
		await writtenArticle(db, both);
		const ctx = contextFor(db, both, now);
		wanted(await submitArticle(ctx, slug, { version: await version() }));
		const refused = await approveArticle(ctx, slug, { version: await version() });
		expect(refused).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(!refused.ok && refused.message).toContain('somebody else');
		await approve();
	});
});

describe('what stands before approval', () => {
	it('is a blocking comment until it is resolved', async () => {
		const { db } = database;
		await measuredCampaign(db, who.tester);
		await writtenArticle(db, who.writer);
		await submit();
		const comment = commentInput.parse({
			quote: 'renders in',
			body: 'At what room temperature?',
			blocking: 'on'
		});
		const { id } = wanted(await commentOnArticle(as('tester'), slug, comment));
		const refused = await approveArticle(as('editor'), slug, { version: await version() });
		expect(refused).toMatchObject({ ok: false, reason: 'invalid' });
		expect(!refused.ok && refused.message).toContain('At what room temperature?');
		wanted(await resolveComment(as('writer'), slug, commentResolve.parse({ comment: id, resolved: 'true' })));
		await approve();
	});

	it('is data nobody signed, a directive that finds nothing and a raised voltage without a caution, each named', async () => {
		const { db } = database;
		await measuredCampaign(db, who.tester, { signed: false, voltage: '1.24' });
		await writtenArticle(db, who.writer, {
			source: sourceOf('aldermoor-1650-first-look', '\n:reading{workload=tile-rendr profile=stock}\n')
		});
		await submit();
		const refused = await approveArticle(as('editor'), slug, { version: await version() });
		if (refused.ok) throw new Error('It was approved.');
		const checks = (refused.detail as { check: string }[]).map((finding) => finding.check);
		expect(new Set(checks)).toEqual(new Set(['sign-off', 'directives', 'caution']));
		expect(refused.message).toContain('not signed off');
		expect(refused.message).toContain('Core voltage');
		expect((await row()).stage).toBe('in-review');
	});
});

describe('after print', () => {
	async function printed() {
		await measuredCampaign(database.db, who.tester);
		await writtenArticle(database.db, who.writer);
		await submit();
		await approve();
		await publish();
	}

	it('a new edition leaves the page until it goes out, and then lists what readers are told', async () => {
		const { db } = database;
		await printed();
		const live = (await row()).liveEditionId;
		const told = correctionInput.parse({
			version: await version(),
			kind: 'correction',
			body: 'The first edition named the wrong firmware.'
		});
		wanted(await reviseArticle(as('editor'), slug, told));
		expect(await row()).toMatchObject({ stage: 'drafting', liveEditionId: live });
		expect(await correctionsOf(db, (await row()).id)).toEqual([]);
		// Readers keep the page, its plates and its place in the lists meanwhile.
		const reader = { db, actor: null, now, origin: 'https://northlight.example' };
		const kept = wanted(await readArticle(reader, slug));
		const [drawn] = await db.select({ key: plate.key }).from(plate);
		expect(kept.page).toContain('+12.5');
		expect((await listArticles(reader, { page: 1 })).rows.map((one) => one.slug)).toEqual([slug]);
		expect(await readPlate(reader, slug, drawn?.key ?? '')).toMatchObject({ ok: true });
		expect(await listParts(reader)).toHaveLength(1);
		const base = (await row()).head;
		wanted(
			await saveRevision(as('writer'), slug, {
				title,
				standfirst: 'With the right firmware.',
				source: sourceOf(),
				basedOn: base
			})
		);
		await submit();
		await approve();
		const later = new Date('2026-11-12T09:00:00.000Z');
		await publish(later);
		expect(await row()).toMatchObject({
			stage: 'published',
			firstPublishedAt: now,
			nextCorrectionBody: null
		});
		expect((await row()).liveEditionId).not.toBe(live);
		expect(await correctionsOf(db, (await row()).id)).toMatchObject([
			{ kind: 'correction', body: told.body, madeAt: later }
		]);
		expect(
			await db
				.select()
				.from(edition)
				.where(eq(edition.id, live ?? 0))
		).toHaveLength(1);
	});

	it('a new edition can be given up, and the page stays', async () => {
		await printed();
		const live = (await row()).liveEditionId;
		wanted(
			await reviseArticle(as('editor'), slug, {
				version: await version(),
				kind: 'update',
				body: 'A third profile.'
			})
		);
		wanted(await keepAsPrinted(as('editor'), slug, { version: await version() }));
		expect(await row()).toMatchObject({ stage: 'published', liveEditionId: live, nextCorrectionBody: null });
	});

	it('a correction is listed at once, and the same form sent twice lists it once', async () => {
		await printed();
		const input = {
			version: await version(),
			kind: 'clarification' as const,
			body: 'Room temperature was 21.4 °C.'
		};
		wanted(await correctArticle(as('editor'), slug, input));
		expect(await correctArticle(as('editor'), slug, input)).toMatchObject({ ok: false, reason: 'conflict' });
		expect(await correctionsOf(database.db, (await row()).id)).toHaveLength(1);
	});

	it('a page is withdrawn with a reason that stays on the list, and its text rests', async () => {
		await printed();
		wanted(
			await withdrawArticle(as('editor'), slug, {
				version: await version(),
				reason: 'Measured on another rig.'
			})
		);
		expect(await row()).toMatchObject({ stage: 'withdrawn', withdrawReason: 'Measured on another rig.' });
		expect(await correctionsOf(database.db, (await row()).id)).toMatchObject([{ kind: 'withdrawal' }]);
		const reader = { db: database.db, actor: null, now, origin: 'https://northlight.example' };
		expect(wanted(await readArticle(reader, slug)).page).toBeNull();
		expect((await listArticles(reader, { page: 1 })).total).toBe(0);
		const saved = await saveRevision(as('writer'), slug, { title, standfirst: '', source: 'x', basedOn: 2 });
		expect(saved).toMatchObject({ ok: false, reason: 'conflict' });
		expect((await outbox(database.db)).slice(-2)).toEqual([
			`writer: Withdrawn: ${title}`,
			`tester: Withdrawn: ${title}`
		]);
	});
});
