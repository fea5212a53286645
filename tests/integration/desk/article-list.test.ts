import { drizzle } from 'drizzle-orm/mysql2';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { articleStart, revisionSave } from '../../../src/lib/schemas/article';
import { articlesBulk, articlesQuery, viewSave } from '../../../src/lib/schemas/article-list';
import * as schema from '../../../src/lib/server/db/schema';
import { approveArticle } from '../../../src/lib/server/services/articles/approve-article';
import { bulkArticles } from '../../../src/lib/server/services/articles/bulk-articles';
import { forgetView, keepView } from '../../../src/lib/server/services/articles/keep-view';
import { listArticles } from '../../../src/lib/server/services/articles/list-articles';
import { readReview } from '../../../src/lib/server/services/articles/read-review';
import { saveRevision } from '../../../src/lib/server/services/articles/save-revision';
import { startArticle } from '../../../src/lib/server/services/articles/start-article';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { outbox, rowOf, slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
const now = new Date('2026-11-11T08:00:00.000Z');
const as = (role: keyof People, at = now) => contextFor(database.db, who[role], at);
const list = async (role: keyof People, filter: Record<string, string> = {}) =>
	wanted(await listArticles(as(role), articlesQuery.parse(filter)));
const titles = async (filter: Record<string, string>) =>
	(await list('editor', filter)).rows.map((row) => row.title);
const bulk = (role: keyof People, input: Record<string, unknown>) =>
	bulkArticles(as(role), articlesBulk.parse(input));

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

const another = async (name: string, by: keyof People, source: string, at = now) => {
	const start = articleStart.parse({
		title: name,
		template: 'short-note',
		campaigns: ['aldermoor-1650-first-look']
	});
	const made = wanted(await startArticle(as(by, at), start));
	const save = revisionSave.parse({ title: name, standfirst: '', source, basedOn: 1 });
	wanted(await saveRevision(as(by, at), made.slug, save));
	return made.slug;
};

describe('the article list', () => {
	it('finds by words of the newest text, begun or as a phrase, and shows where they stand', async () => {
		await another('Quiet pumps', 'editor', 'The pump *hums* at a fixed clock, say the fans.');
		expect(await titles({ q: 'hums' })).toEqual(['Quiet pumps']);
		expect(await titles({ q: 'hum' })).toEqual(['Quiet pumps']);
		expect(await titles({ q: '"clock fixed"' })).toEqual([]);
		const [row] = (await list('editor', { q: '"fixed clock" pump' })).rows;
		expect(row?.snippet?.filter((part) => part.hit).map((part) => part.text)).toContain('fixed clock');
		const renewed = revisionSave.parse({ title: 'Quiet pumps', standfirst: '', source: 'Gone.', basedOn: 2 });
		wanted(await saveRevision(as('editor'), 'quiet-pumps', renewed));
		expect(await titles({ q: 'hums' }), 'an older revision is not the text').toEqual([]);
	});

	it('takes words the database would read as orders, and words too short for it, as what they are', async () => {
		for (const q of ['+-><()~*"@', '"', "';--", 'the of']) expect(await titles({ q })).toEqual([]);
		expect(await titles({ q: 'ag' }), 'too short: part of a title').toEqual([title]);
	});

	it('filters by stage, person, campaign, tag and day of the last change', async () => {
		const old = await another('Quiet pumps', 'editor', 'x', new Date('2026-10-31T22:59:00Z'));
		wanted(await bulk('editor', { act: 'tag', slugs: [old], tag: '  Cooling ' }));
		expect(await titles({ stage: 'drafting', tag: 'cooling' })).toEqual(['Quiet pumps']);
		expect(await titles({ writer: who.writer.id })).toEqual([title]);
		expect(await titles({ campaign: 'aldermoor-1650-first-look' })).toHaveLength(2);
		expect(await titles({ campaign: 'another' })).toEqual([]);
		// 22:59 UTC is 23:59 on the same day in the publication's zone, an hour before it is November there.
		expect(await titles({ to: '2026-10-31' })).toEqual(['Quiet pumps']);
		expect(await titles({ from: '2026-11-01' })).toEqual([title]);
	});

	it('is closed to the liaison, and asks as often for many articles as for one', async () => {
		expect(await listArticles(as('liaison'), articlesQuery.parse({}))).toMatchObject({ reason: 'forbidden' });
		const asked: string[] = [];
		const logger = { logQuery: (query: string) => void asked.push(query) };
		const db = drizzle(database.pool, { schema, mode: 'default', logger });
		const count = async () => {
			asked.length = 0;
			wanted(await listArticles(contextFor(db, who.editor, now), articlesQuery.parse({ q: 'fixed' })));
			return asked.length;
		};
		const one = await count();
		for (const name of ['Pump a', 'Pump b', 'Pump c']) await another(name, 'writer', 'fixed');
		expect(await count()).toBe(one);
	});
});

describe('several at once', () => {
	it('are filed together; what is so already or is not one’s own stays and is named', async () => {
		const foreign = await another('Quiet pumps', 'editor', 'x');
		const tag = (slugs: string[]) => bulk('writer', { act: 'tag', slugs, tag: 'fixed clocks' });
		expect(wanted(await tag([slug, foreign]))).toEqual({
			changed: 1,
			kept: [{ title: 'Quiet pumps', why: 'is not yours to change' }]
		});
		expect(wanted(await tag([slug])).kept).toEqual([{ title, why: 'has the tag “fixed clocks” already' }]);
		wanted(await bulk('writer', { act: 'untag', slugs: [slug], tag: 'fixed clocks' }));
		expect((await list('editor')).tags).toEqual([]);
		expect(await versionOf(database.db, slug), 'a tag is not a change of the text').toBe(2);
	});

	it('go to another author, who is told once; nobody then judges what they wrote before', async () => {
		const own = await another('Quiet pumps', 'editor', 'x');
		const give = { act: 'hand-over', slugs: [own, slug], person: who.writer.id };
		expect(await bulk('writer', give)).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(wanted(await bulk('editor', give))).toMatchObject({
			changed: 1,
			kept: [{ title, why: expect.stringContaining('already') as string }]
		});
		expect(await outbox(database.db)).toEqual(['writer: Yours now: Quiet pumps']);
		expect((await rowOf(database.db, own)).authorId).toBe(who.writer.id);
		wanted(await submitArticle(as('writer'), own, { version: await versionOf(database.db, own) }));
		const seen = { version: await versionOf(database.db, own) };
		expect(await approveArticle(as('editor'), own, seen)).toMatchObject({ ok: false, reason: 'forbidden' });
		expect(wanted(await readReview(as('editor'), own)).moves).not.toContain('approve');
	});

	it('are refused with words for a tag that is none and for nothing ticked', () => {
		for (const input of [
			{ act: 'tag', slugs: [slug], tag: '<b>' },
			{ act: 'tag', slugs: '', tag: 'x' },
			{ act: 'tag', slugs: Array<string>(101).fill(slug), tag: 'x' },
			{ act: 'delete', slugs: [slug] }
		])
			expect(articlesBulk.safeParse(input).success).toBe(false);
	});
});

describe('a view', () => {
	const keep = (role: keyof People, more: Record<string, string> = {}) =>
		keepView(as(role), viewSave.parse({ name: 'Pumps', query: 'q=pump&page=3&evil=1', ...more }));

	it('keeps a filter under a name, for oneself or for all, and is its owner’s to forget', async () => {
		expect(wanted(await keep('editor'))).toEqual({ query: 'q=pump' });
		expect((await list('writer')).views).toEqual([]);
		wanted(await keep('editor', { shared: 'on', query: 'q=pump&stage=drafting' }));
		const [view] = (await list('writer')).views;
		expect(view).toMatchObject({ name: 'Pumps', query: 'q=pump&stage=drafting', own: false });
		expect(await forgetView(as('writer'), { view: view?.id ?? 0 })).toMatchObject({ reason: 'not_found' });
		wanted(await forgetView(as('editor'), { view: view?.id ?? 0 }));
		expect((await list('editor')).views).toEqual([]);
	});

	it('of the list as it opens is refused', async () => {
		expect(await keep('editor', { query: 'page=2' })).toMatchObject({ ok: false, reason: 'invalid' });
	});
});
