import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { withNews, type BoardNews, type WiredNews } from '../../../src/lib/domain/bench/board-news';
import type { Actor } from '../../../src/lib/domain/people/roles';
import type { Context } from '../../../src/lib/server/context';
import { openDatabase, type Database } from '../../../src/lib/server/db/client';
import { profile, user } from '../../../src/lib/server/db/schema';
import { excludeReading } from '../../../src/lib/server/services/bench/count-reading';
import { editCampaign } from '../../../src/lib/server/services/bench/edit-campaign';
import { editRun } from '../../../src/lib/server/services/bench/edit-run';
import { readBoard, readBoardNews, type Board } from '../../../src/lib/server/services/bench/read-board';
import { readCampaign } from '../../../src/lib/server/services/bench/read-campaign';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { signCells } from '../../../src/lib/server/services/bench/sign-cells';
import { voidRun } from '../../../src/lib/server/services/bench/void-run';
import { contextFor } from '../../support/context';
import { emptyTables, testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { fixtureReadings, plannedCampaign, stockBench, valueOf } from './bench';

let database: TestDatabase;
/** What another process has: a pool, and so a memory, of its own on the same database. */
let elsewhere: Database;
let all: Record<'tester' | 'writer' | 'editor' | 'liaison' | 'admin', Actor>;
let ctx: Context;
let there: Context;
let campaign: string;

beforeAll(async () => {
	database = await testDatabase();
	elsewhere = openDatabase(database.url);
});
afterAll(async () => {
	await elsewhere.pool.end();
	await database.close();
});
beforeEach(async () => {
	await emptyTables(database);
	all = await people(database.db);
	ctx = contextFor(database.db, all.tester);
	there = contextFor(elsewhere.db, all.tester);
	await stockBench(database.db, all.tester, ctx.now);
	campaign = await plannedCampaign(ctx);
});

const stock = { profile: 'stock', workload: 'prime-search' };
const tuned = { profile: '', workload: 'prime-search' };
const record = (by: Context, readings: number[], cell = stock) =>
	recordRun(by, campaign, {
		...cell,
		unit: 'events/s',
		readings,
		ambientC: null,
		startedAt: null,
		notes: ''
	}).then(valueOf);

const board = (by: Context) => readBoard(by, campaign, stock).then(valueOf);
const newsOf = (by: Context, { tag }: Pick<Board, 'tag'>) =>
	readBoardNews(by, campaign, { ...stock, tag }).then(valueOf);
const wired = (news: BoardNews) => JSON.parse(JSON.stringify(news)) as WiredNews;

/** Cells that were told, by name; 'anew' where the board has to be read whole. */
const told = (news: BoardNews, { cells }: Board) =>
	news.kind === 'anew' ? 'anew' : news.cells.map(({ at }) => `${cells[at]?.profile}/${cells[at]?.workload}`);

/** Follows a board through one change as the page does, and holds it against one worked out from nothing. */
async function follow(before: Board, by = ctx): Promise<Board> {
	const after = withNews(before, wired(await newsOf(by, before)));
	if (!after) throw new Error('the board had to be read anew');
	const fresh = valueOf(await readCampaign(by, campaign));
	expect(after.cells).toEqual(fresh.figures.cells);
	expect(after).toEqual(await board(by));
	return after;
}

beforeEach(() => {
	tuned.profile =
		[...new Set(fixtureReadings().map((row) => row.profile))].find((one) => one !== 'stock') ?? '';
});

describe('news of a board', () => {
	it('are the cells that changed and no others, and none where nothing did', async () => {
		await record(ctx, [10, 11]);
		const before = await board(ctx);
		expect(told(await newsOf(ctx, before), before)).toEqual([]);
		await record(ctx, [12], tuned);
		const news = await newsOf(ctx, before);
		expect(told(news, before)).toEqual([`${tuned.profile}/prime-search`]);
		expect(news).toMatchObject({ progress: { taken: 3 }, current: tuned.profile, from: before.tag });
	});

	it('carry every kind of change to the same board as one that is read from nothing', async () => {
		const first = await record(ctx, [10, 11, 12]);
		await record(ctx, [13, 14, 15], tuned);
		let now = await board(ctx);
		const second = await record(ctx, [10.5]);
		now = await follow(now);
		const [reading] = first.readings;
		valueOf(await excludeReading(ctx, campaign, { reading: reading?.id ?? 0, reason: 'a window opened' }));
		now = await follow(now);
		valueOf(await voidRun(ctx, campaign, { run: second.id, reason: 'wrong cell' }));
		now = await follow(now);
		const run = now.selected.runs.find((one) => one.id === first.id);
		valueOf(
			await editRun(ctx, campaign, {
				run: first.id,
				version: run?.version ?? 1,
				ambient: '21.5',
				started: '2026-11-10T09:30',
				notes: 'seen again'
			})
		);
		now = await follow(now);
		expect(now.cells.find((cell) => cell.workload === 'prime-search')?.ambientC).toBe(21.5);
		await record(ctx, [10, 11, 12, 13, 14]);
		now = await follow(now);
		valueOf(await signCells(ctx, campaign, { profile: 'stock', workload: 'prime-search' }));
		now = await follow(now);
		await database.db.update(user).set({ name: 'Renamed Tester' }).where(eq(user.id, all.tester.id));
		// Who planned the campaign is on the board too, and no news.
		expect(await newsOf(ctx, now)).toEqual({ kind: 'anew' });
		now = await board(ctx);
		expect(now.selected.runs[0]?.tester).toBe('Renamed Tester');
		expect(now.cells).toEqual(valueOf(await readCampaign(ctx, campaign)).figures.cells);
	});

	it('of what another process stored are told by this one, and the other way round', async () => {
		let here = await board(ctx);
		let other = await board(there);
		// The same board has the same tag in both, so that either can go on from what the other handed out.
		expect(other.tag).toBe(here.tag);
		await record(there, [10]);
		here = await follow(here, ctx);
		await record(ctx, [11]);
		other = await follow(other, there);
		here = await follow(here, ctx);
		expect(here.tag).toBe(other.tag);
		expect(here.cells.find((cell) => cell.profile === 'stock')?.summary?.n ?? 0).toBe(2);
	});

	it('lose nothing of a burst, though those who ask in it share one reading', async () => {
		const before = await board(ctx);
		const writers = Array.from({ length: 8 }, (_, n) =>
			record(n % 2 ? ctx : there, [10 + n], n % 4 < 2 ? stock : tuned)
		);
		const during = Array.from({ length: 10 }, () => newsOf(ctx, before));
		await Promise.all(writers);
		const after = await Promise.all(Array.from({ length: 10 }, () => newsOf(ctx, before)));
		await Promise.all(during);
		expect(new Set(after.map((news) => (news.kind === 'changed' ? news.tag : 'anew'))).size).toBe(1);
		const last = await follow(before);
		expect(last.progress.taken).toBe(8);
		for (const news of after) expect(withNews(before, wired(news))).toEqual(last);
	});

	it('send to the whole board whoever has one that is not known, or whose plan was changed', async () => {
		const before = await board(ctx);
		expect(await newsOf(ctx, { tag: 'of-another-day' })).toEqual({ kind: 'anew' });
		valueOf(
			await editCampaign(ctx, campaign, {
				name: 'Second look',
				purpose: '',
				dueOn: '',
				version: before.head.version
			})
		);
		expect(await newsOf(ctx, before)).toEqual({ kind: 'anew' });
		const again = await board(ctx);
		await database.db.update(profile).set({ name: 'As delivered' }).where(eq(profile.slug, 'stock'));
		expect(await newsOf(ctx, again)).toEqual({ kind: 'anew' });
	});

	it('are nobody’s who may not see the bench, whatever others were just told', async () => {
		const { tag } = await board(ctx);
		const [mine, theirs, nowhere] = await Promise.all([
			readBoardNews(ctx, campaign, { ...stock, tag }),
			readBoardNews({ ...ctx, actor: all.liaison }, campaign, { ...stock, tag }),
			readBoardNews(ctx, 'nowhere', { ...stock, tag })
		]);
		expect(mine.ok).toBe(true);
		expect(theirs).toMatchObject({ reason: 'forbidden' });
		expect(nowhere).toMatchObject({ reason: 'not_found' });
	});
});
