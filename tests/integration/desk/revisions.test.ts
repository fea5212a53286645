import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { auditEvent, revision } from '../../../src/lib/server/db/schema';
import { revisionsQuery } from '../../../src/lib/schemas/article';
import { readListing } from '../../../src/lib/schemas/listing';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { keepPresence } from '../../../src/lib/server/services/articles/keep-presence';
import { nameRevision } from '../../../src/lib/server/services/articles/name-revision';
import { readRevisions } from '../../../src/lib/server/services/articles/read-revisions';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign, sourceOf } from './measured-campaign';

let database: TestDatabase;
let who: People;
const start = new Date('2026-11-11T08:00:00.000Z');
const as = (role: keyof People, seconds = 0) =>
	contextFor(database.db, who[role], new Date(start.getTime() + seconds * 1000));
const asked = (query: string) => readListing(revisionsQuery, new URLSearchParams(query));
const source = sourceOf('aldermoor-1650-first-look');
const save = (text: string, basedOn: number, by: keyof People = 'writer') =>
	saveRevision(as(by), slug, { title, standfirst: 'What a fixed clock costs.', source: text, basedOn });

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

describe('the list of revisions', () => {
	it('says who, when, and how many words came and went', async () => {
		wanted(await save(`${source}\n\nThree more words.`, 2));
		wanted(await save(`${source}\n\nThree other words here.`, 3, 'editor'));
		const { list } = wanted(await readRevisions(as('writer'), slug, asked('')));
		expect(list.slice(0, 2)).toEqual([
			expect.objectContaining({ number: 4, savedByName: who.editor.name, wordsAdded: 3, wordsRemoved: 2 }),
			expect.objectContaining({ number: 3, savedByName: who.writer.name, wordsAdded: 3, wordsRemoved: 0 })
		]);
	});

	it('finds the ones with a name, and by words of it, signs of a pattern taken as they are', async () => {
		wanted(await nameRevision(as('writer'), slug, { number: 2, label: 'as sent to 100 % of them' }));
		const numbers = async (query: string) =>
			wanted(await readRevisions(as('writer'), slug, asked(query))).list.map((one) => one.number);
		expect(await numbers('named=true')).toEqual([2]);
		expect(await numbers('q=sent')).toEqual([2]);
		expect(await numbers('q=%25 of')).toEqual([2]);
		expect(await numbers('q=1_0')).toEqual([]);
		expect(await numbers('')).toEqual([2, 1]);
	});

	it('falls back to the newest two where the address names none that can be read', async () => {
		const { before, after } = wanted(await readRevisions(as('writer'), slug, asked('from=x&to=-3')));
		expect([before.number, after.number]).toEqual([1, 2]);
		expect(await readRevisions(as('writer'), slug, asked('from=1&to=99'))).toMatchObject({
			ok: false,
			reason: 'not_found'
		});
	});
});

describe('a name of a revision', () => {
	it('is given, changed and taken away by the author and the editors, each time logged', async () => {
		wanted(await nameRevision(as('writer'), slug, { number: 1, label: 'first' }));
		wanted(await nameRevision(as('editor'), slug, { number: 1, label: 'the first' }));
		wanted(await nameRevision(as('editor'), slug, { number: 1, label: '' }));
		const log = await database.db
			.select({ before: auditEvent.before, after: auditEvent.after })
			.from(auditEvent)
			.where(eq(auditEvent.act, 'article.name-revision'))
			.orderBy(auditEvent.id);
		expect(log).toEqual([
			{ before: { revision: 1, name: null }, after: { revision: 1, name: 'first' } },
			{ before: { revision: 1, name: 'first' }, after: { revision: 1, name: 'the first' } },
			{ before: { revision: 1, name: 'the first' }, after: { revision: 1, name: null } }
		]);
		const [row] = await database.db.select().from(revision).where(eq(revision.number, 1));
		expect(row?.label).toBeNull();
	});

	it('is for nobody else, and of no revision that is not there', async () => {
		for (const role of ['tester', 'liaison', 'admin'] as const)
			expect(await nameRevision(as(role), slug, { number: 1, label: 'x' })).toMatchObject({
				reason: 'forbidden'
			});
		expect(await nameRevision(as('writer'), slug, { number: 9, label: 'x' })).toMatchObject({
			reason: 'not_found'
		});
	});
});

describe('two texts', () => {
	it('are compared on the page as it would print, or in the source', async () => {
		wanted(await save(source.replace('profile=fixed-495', 'profile=stock'), 2));
		const onPage = wanted(await readRevisions(as('writer'), slug, asked('')));
		expect(onPage.changes).toBeGreaterThan(0);
		const changed = onPage.blocks?.flatMap((block) => ('html' in block ? [block.html] : [])).join('') ?? '';
		expect(changed).toMatch(/<del>[\s\S]*<ins>/);
		// What is shown is drawn; a plate in the middle of what is left out is not.
		const whole = wanted(await readRevisions(as('writer'), slug, asked('all=true'))).blocks ?? [];
		expect(whole.map((block) => ('html' in block ? block.html : '')).join('')).toContain('<svg');
		expect(wanted(await readRevisions(as('writer'), slug, asked('view=source'))).blocks).toBeNull();
	});

	it('may be an edition as it was frozen and what was written since', async () => {
		const version = () => versionOf(database.db, slug);
		wanted(await submitArticle(as('writer'), slug, { version: await version() }));
		wanted(await approveArticle(as('editor'), slug, { version: await version() }));
		wanted(await save(`${source}\n\nWritten since.`, 2));
		const { before, after, blocks } = wanted(await readRevisions(as('writer'), slug, asked('from=e1&to=3')));
		expect([before.kind, before.number, after.kind, after.number]).toEqual(['edition', 1, 'revision', 3]);
		const changes = blocks?.filter((one) => one.state === 'added') ?? [];
		expect(changes).toEqual([
			{ state: 'added', html: expect.stringContaining('<ins>Written since.</ins>') as string }
		]);
	});
});

describe('who has an article open', () => {
	const here = (role: keyof People, seconds: number, lastKeyAgoS: number | null = null, leaving = false) =>
		keepPresence(as(role, seconds), slug, { lastKeyAgoS, leaving });

	it('is said to the others, with their last key, until they leave or are not heard of', async () => {
		expect(wanted(await here('writer', 0))).toEqual({ others: [] });
		expect(wanted(await here('editor', 10, 3))).toEqual({
			others: [{ name: who.writer.name, lastKeyAgoS: null }]
		});
		expect(wanted(await here('writer', 20))).toEqual({
			others: [{ name: who.editor.name, lastKeyAgoS: 13 }]
		});
		wanted(await here('editor', 21, null, true));
		expect(wanted(await here('writer', 22))).toEqual({ others: [] });
		expect(wanted(await here('editor', 100))).toEqual({ others: [] });
	});

	it('is for those who may edit it', async () => {
		for (const role of ['tester', 'liaison', 'admin'] as const)
			expect(await here(role, 0)).toMatchObject({ ok: false, reason: 'forbidden' });
	});

	it('gives the revision both began from with a conflict', async () => {
		wanted(await save('theirs', 2, 'editor'));
		expect(await save('mine', 2)).toMatchObject({
			reason: 'conflict',
			detail: { number: 3, source: 'theirs', base: { source } }
		});
	});
});
