import { drizzle } from 'drizzle-orm/mysql2';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { articleStart, commentInput, deskFilter } from '../../../src/lib/schemas/article';
import * as schema from '../../../src/lib/server/db/schema';
import { askChanges } from '../../../src/lib/server/services/articles/ask-changes';
import { commentOnArticle } from '../../../src/lib/server/services/articles/comment-on-article';
import { readDesk } from '../../../src/lib/server/services/articles/read-desk';
import { planSlot } from '../../../src/lib/server/services/articles/schedule-article';
import { startArticle } from '../../../src/lib/server/services/articles/start-article';
import { submitArticle } from '../../../src/lib/server/services/articles/submit-article';
import { POST as save } from '../../../src/routes/(staff)/desk/articles/[slug]/save/+server';
import { useApp } from '../../support/app';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { fakeEvent } from '../../support/event';
import { people } from '../../support/people';
import { slug, title, versionOf, wanted, writtenArticle, type People } from './desk-test';
import { measuredCampaign } from './measured-campaign';

let database: TestDatabase;
let who: People;
const now = new Date('2026-11-11T08:00:00.000Z');
const as = (role: keyof People) => contextFor(database.db, who[role], now);
const version = () => versionOf(database.db, slug);
const desk = async (role: keyof People, filter: Record<string, string> = {}) =>
	wanted(await readDesk(as(role), deskFilter.parse(filter)));

beforeAll(async () => {
	database = await testDatabase();
	useApp(database);
});
afterAll(() => database.close());
beforeEach(async () => {
	await emptyTables(database);
	who = await people(database.db);
});

describe('what waits', () => {
	it('is a review for the editor, an answer for the author, a signature for the tester', async () => {
		await measuredCampaign(database.db, who.tester, { signed: false });
		await writtenArticle(database.db, who.writer);
		expect((await desk('tester')).waiting).toMatchObject([
			{ detail: '2 cells have all readings and no signature.', action: { label: 'Sign off' } }
		]);
		expect((await desk('editor')).waiting).toEqual([]);
		wanted(await submitArticle(as('writer'), slug, { version: await version() }));
		expect((await desk('editor')).waiting).toMatchObject([{ title, action: { label: 'Review' } }]);
		wanted(
			await commentOnArticle(as('tester'), slug, commentInput.parse({ body: 'Which rig?', blocking: 'on' }))
		);
		expect((await desk('writer')).waiting).toMatchObject([{ title, detail: '1 comment to answer.' }]);
		wanted(await askChanges(as('editor'), slug, { version: await version(), words: 'Name the rig.' }));
		expect((await desk('writer')).waiting).toMatchObject([
			{ detail: 'Changes asked; 2 comments to answer.' }
		]);
		expect((await desk('editor')).waiting).toEqual([]);
	});

	it('is nothing of this for the liaison', async () => {
		expect(await readDesk(as('liaison'), deskFilter.parse({}))).toMatchObject({
			ok: false,
			reason: 'forbidden'
		});
	});
});

describe('in progress', () => {
	it('says how far the bench is and what stands before print, and finds by stage, title and author', async () => {
		await measuredCampaign(database.db, who.tester, { signed: false });
		await writtenArticle(database.db, who.writer);
		wanted(await planSlot(as('editor'), slug, { version: await version(), slot: '2026-11-14T15:00' }));
		const [row] = (await desk('editor')).inProgress.rows;
		expect(row).toMatchObject({
			title,
			stage: 'drafting',
			bench: '0 of 2 signed',
			print: { parts: ['cells not signed off'] }
		});
		expect((await desk('editor', { stage: 'approved' })).inProgress.total).toBe(0);
		expect((await desk('editor', { q: 'brisk' })).inProgress.total).toBe(1);
		expect((await desk('editor', { q: '100%' })).inProgress.total).toBe(0);
		expect((await desk('editor', { mine: 'on' })).inProgress.total).toBe(0);
		expect((await desk('writer', { mine: 'on' })).inProgress.total).toBe(1);
		const planned = (await desk('editor')).days.flatMap((day) => day.events);
		expect(planned).toMatchObject([{ kind: 'planned', title, time: '15:00' }]);
	});

	it('asks the database as often for thirty articles as for one', async () => {
		const asked: string[] = [];
		const logger = { logQuery: (query: string) => void asked.push(query) };
		const db = drizzle(database.pool, { schema, mode: 'default', logger });
		const count = async () => {
			asked.length = 0;
			wanted(await readDesk(contextFor(db, who.editor, now), deskFilter.parse({})));
			return asked.length;
		};
		await measuredCampaign(database.db, who.tester);
		await writtenArticle(database.db, who.writer);
		wanted(await submitArticle(as('writer'), slug, { version: await version() }));
		const forOne = await count();
		for (let n = 0; n < 29; n++) {
			const started = await startArticle(
				as('writer'),
				articleStart.parse({
					title: `Note ${n}`,
					template: 'short-note',
					campaigns: ['aldermoor-1650-first-look']
				})
			);
			wanted(await submitArticle(as('writer'), wanted(started).slug, { version: 1 }));
		}
		expect(await count()).toBe(forOne);
		expect(forOne).toBeLessThan(25);
	});
});

describe('the editor’s save over HTTP', () => {
	const post = (json: unknown) =>
		save(
			fakeEvent({
				path: `/desk/articles/${slug}/save`,
				params: { slug },
				actor: who.writer,
				json
			}) as unknown as Parameters<typeof save>[0]
		);

	it('answers with the revision, and with the newer one on a conflict', async () => {
		await measuredCampaign(database.db, who.tester);
		await writtenArticle(database.db, who.writer);
		const saved = await post({ title, standfirst: '', source: 'mine', basedOn: 2 });
		expect(saved.status).toBe(200);
		expect(await saved.json()).toMatchObject({ revision: 3, changed: true });
		const refused = await post({ title, standfirst: '', source: 'older', basedOn: 2 });
		expect(refused.status).toBe(409);
		expect(refused.headers.get('content-type')).toBe('application/problem+json');
		expect(await refused.json()).toMatchObject({ context: { number: 3, source: 'mine' } });
	});

	it('refuses what is no text for an article, beside the field', async () => {
		await measuredCampaign(database.db, who.tester);
		await writtenArticle(database.db, who.writer);
		const refused = await post({ title: 'x', standfirst: '', source: 'a'.repeat(400_001), basedOn: 2 });
		expect(refused.status).toBe(422);
		const { errors } = (await refused.json()) as { errors: Record<string, string[]> };
		expect(Object.keys(errors).sort()).toEqual(['source', 'title']);
	});
});
