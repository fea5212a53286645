import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { exploreAsked } from '../../../src/lib/schemas/explore';
import type { Context } from '../../../src/lib/server/context';
import { explore } from '../../../src/lib/server/services/bench/explore';
import { importReadings } from '../../../src/lib/server/services/bench/import-readings';
import { readBoard } from '../../../src/lib/server/services/bench/read-board';
import { readComparison } from '../../../src/lib/server/services/bench/read-comparison';
import { readDrift } from '../../../src/lib/server/services/bench/read-drift';
import { readTradeOffs } from '../../../src/lib/server/services/bench/read-trade-offs';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { summariseCells } from '../../../src/lib/server/services/bench/summarise-cells';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { fixture, fixtureReadings, plannedCampaign, reference, stockBench, valueOf } from './bench';

let database: TestDatabase;
let ctx: Context;
let liaison: Context;
let whole: string;
let again: string;

/** What stock measured, again and again; the last but one is far off. */
const daily = [100, 100.3, 99.8, 100.1, 99.9, 100.2, 100, 99.7, 100.1, 103, 100];

const stockRun = (campaign: string, day: number, factor: number) => {
	const [first] = fixtureReadings().filter(
		(row) => row.profile === 'stock' && row.workload === 'prime-search'
	);
	if (!first) throw new Error('no stock');
	const at = new Date(Date.UTC(2025, 0, 1 + day, 9));
	return recordRun(ctx, campaign, {
		profile: 'stock',
		workload: 'prime-search',
		unit: first.unit,
		readings: [first.value * factor, first.value * factor * 1.001],
		ambientC: 21,
		startedAt: at,
		notes: ''
	});
};

beforeAll(async () => {
	database = await testDatabase();
	const staff = await people(database.db);
	ctx = contextFor(database.db, staff.tester);
	liaison = contextFor(database.db, staff.liaison);
	await stockBench(database.db, staff.tester, ctx.now);
	whole = await plannedCampaign(ctx, 'From a file');
	valueOf(await importReadings(ctx, whole, { text: fixture('readings.csv'), leaveRefused: false }));
	again = await plannedCampaign(ctx, 'Stock again');
	for (const [day, percent] of daily.entries()) valueOf(await stockRun(again, day, percent / 100));
});
afterAll(() => database.close());

describe('a campaign compared', () => {
	it('tells the API and the screen the same verdicts', async () => {
		const [screen, api] = [
			valueOf(await readComparison(ctx, whole, 'stock')),
			valueOf(await summariseCells(ctx, whole, 'stock'))
		];
		expect(screen.together).toBe(api.together);
		expect(screen.cells.map((cell) => cell.comparison)).toEqual(api.cells.map((cell) => cell.comparison));
		expect(screen.plates.map((plate) => plate.kind)).toEqual(['gains', 'overall']);
	});

	it('says of what is not settled how many more runs it would take', async () => {
		const { cells } = valueOf(await readComparison(ctx, whole, 'stock'));
		for (const cell of cells)
			expect(cell.notes.needed !== null).toBe(cell.comparison?.verdict === 'not-enough');
	});
});

describe('trade-offs', () => {
	it('take the geometric mean of each class, which together are R’s of the whole', async () => {
		const { sides } = valueOf(await readTradeOffs(ctx, whole, { baseline: 'stock', part: null }));
		for (const { profile, ratio } of reference().overall) {
			const classes = sides.find((side) => side.profile === profile)?.classes ?? [];
			const logs = classes.flatMap(({ overall }) =>
				overall ? [Math.log(overall.ratio) * overall.workloads.length] : []
			);
			const count = classes.reduce((sum, { overall }) => sum + (overall?.workloads.length ?? 0), 0);
			if (count === 7)
				expect(logs.reduce((sum, log) => sum + log, 0) / count).toBeCloseTo(Math.log(ratio), 10);
			expect(count).toBeGreaterThan(0);
		}
	});

	it('claim no more than the comparison does', async () => {
		const { sides } = valueOf(await readTradeOffs(ctx, whole, { baseline: 'stock', part: null }));
		const { cells, workloads } = valueOf(await readComparison(ctx, whole, 'stock'));
		for (const { profile, words } of sides) {
			const better = cells.filter(
				(cell) => cell.profile === profile && cell.comparison?.verdict === 'better'
			);
			for (const { name, slug } of workloads) {
				if (words.gains?.includes(`${name} +`)) expect(better.map((cell) => cell.workload)).toContain(slug);
			}
		}
	});

	it('are not for the liaison', async () => {
		expect(await readTradeOffs(liaison, whole, { baseline: null, part: null })).toMatchObject({
			ok: false,
			reason: 'forbidden'
		});
	});
});

describe('drift', () => {
	it('holds every run of stock over campaigns in the order they were taken, and names the signal', async () => {
		const page = valueOf(await readDrift(ctx, { rig: 'n-12', workload: 'prime-search' }));
		const points = page.drift?.points ?? [];
		expect(points.map((point) => point.at)).toEqual([...points.map((point) => point.at)].sort());
		expect(points.length).toBeGreaterThan(daily.length);
		expect(points[9]?.signals.join('; ')).toContain('above the upper limit');
		expect(page.plate?.points).toEqual(points);
	});

	it('opens where stock was run most often', async () => {
		const named = valueOf(await readDrift(ctx, { rig: 'n-12', workload: 'prime-search' }));
		const opened = valueOf(await readDrift(ctx, {}));
		expect(named.facts?.runs.length).toBeGreaterThan(1);
		expect(opened.chosen).toEqual(named.chosen);
	});

	it('marks on the board what was measured while the rig was off', async () => {
		const board = valueOf(await readBoard(ctx, again, { profile: '', workload: '' }));
		expect(board.off).toEqual([
			expect.objectContaining({
				profile: 'stock',
				workload: 'prime-search',
				words: expect.stringContaining('above the upper limit') as string
			})
		]);
	});

	it('is not for the liaison, and is empty for a bench without stock of that name', async () => {
		expect((await readDrift(liaison, {})).ok).toBe(false);
		expect(valueOf(await readDrift(ctx, { rig: 'nowhere' })).chosen?.rig).toBe('n-12');
	});
});

describe('the explorer', () => {
	const look = async (query: string) => valueOf(await explore(ctx, exploreAsked(new URLSearchParams(query))));

	it('looks nothing up until something is chosen', async () => {
		expect(await look('')).toMatchObject({ asked: false, found: null });
	});

	it('pools the runs of all campaigns of a rig', async () => {
		const { found } = await look('rig=n-12&workload=prime-search');
		const stock = found?.cells.find((cell) => cell.profile === 'stock');
		expect(stock?.summary?.n).toBe(7 + 2 * daily.length);
		expect(found?.plates.map((plate) => plate.kind)).toEqual(['gains']);
	});

	it('keeps to the days asked for, the last one included', async () => {
		const { found } = await look('rig=n-12&from=2025-01-01&to=2025-01-02&plate=scores');
		expect(found?.cells[0]?.summary?.n).toBe(4);
		expect(found?.plates.map((plate) => plate.kind)).toEqual(['scores']);
		expect((await look('rig=n-12&from=2024-01-01&to=2024-01-02')).found).toBeNull();
	});

	it('reads an address that nobody would write as if it did not ask', async () => {
		expect(exploreAsked(new URLSearchParams('from=yesterday&plate=pie'))).toMatchObject({
			from: undefined,
			plate: 'gains'
		});
	});
});
