import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { importReadings } from '../../../src/lib/server/services/bench/import-readings';
import { recordRun } from '../../../src/lib/server/services/bench/record-run';
import { summariseCells, type CampaignSummary } from '../../../src/lib/server/services/bench/summarise-cells';
import { contextFor } from '../../support/context';
import { testDatabase, type TestDatabase } from '../../support/database';
import { people } from '../../support/people';
import { fixture, fixtureReadings, plannedCampaign, reference, stockBench, valueOf } from './bench';

let database: TestDatabase;
let byApi: CampaignSummary;
let byFile: CampaignSummary;

beforeAll(async () => {
	database = await testDatabase();
	const { tester } = await people(database.db);
	const ctx = contextFor(database.db, tester);
	await stockBench(database.db, tester, ctx.now);
	const sent = await plannedCampaign(ctx, 'Sent by a script');
	const rows = fixtureReadings();
	for (const cell of new Set(rows.map((row) => `${row.profile}/${row.workload}`))) {
		const own = rows.filter((row) => `${row.profile}/${row.workload}` === cell);
		const [first] = own;
		if (!first) throw new Error('empty cell');
		const { profile, workload, unit } = first;
		const readings = own.map((row) => row.value);
		valueOf(
			await recordRun(ctx, sent, {
				profile,
				workload,
				unit,
				readings,
				ambientC: 21.4,
				startedAt: new Date(first.startedAt),
				notes: ''
			})
		);
	}
	const imported = await plannedCampaign(ctx, 'From a file');
	valueOf(await importReadings(ctx, imported, { text: fixture('readings.csv'), leaveRefused: false }));
	byApi = valueOf(await summariseCells(ctx, sent, 'stock'));
	byFile = valueOf(await summariseCells(ctx, imported, null));
});
afterAll(() => database.close());

const cellOf = (summary: CampaignSummary, key: string) => {
	const found = summary.cells.find((cell) => `${cell.profile}/${cell.workload}` === key);
	if (!found) throw new Error(`no cell ${key}`);
	return found;
};
/** R printed twelve significant digits. */
const near = (actual: number | null | undefined, expected: number | undefined) => {
	if (actual === null || actual === undefined || expected === undefined) throw new Error('no figure');
	expect(Math.abs(actual - expected)).toBeLessThanOrEqual(Math.abs(expected) * 1e-11);
};

// Expected: R 4.2.2, `Rscript reference.R` beside tests/fixtures/reference.txt.
describe('the summary of a campaign', () => {
	it.each(reference().cells)('says what R says of $key', ({ key, n, mean, median, sd, cv, low, high }) => {
		const cell = cellOf(byApi, key);
		expect(cell.n).toBe(n);
		near(cell.mean, mean);
		near(cell.median, median);
		near(cell.sd, sd);
		near(cell.cvPercent, cv);
		near(cell.ci95?.[0], low);
		near(cell.ci95?.[1], high);
	});

	it.each(reference().ratios)('holds $key against stock as R does', ({ key, ratio }) => {
		const { comparison } = cellOf(byApi, key);
		near(comparison?.ratio, ratio);
		expect(comparison?.gainPercent).toBeCloseTo((ratio - 1) * 100, 8);
		expect(comparison?.ci95?.[0]).toBeLessThan(ratio);
		expect(comparison?.ci95?.[1]).toBeGreaterThan(ratio);
	});

	it('gives the geometric mean of ratios that R gives', () => {
		expect(byApi.overall).toHaveLength(3);
		for (const { profile, ratio } of reference().overall) {
			near(byApi.overall.find((row) => row.profile === profile)?.ratio, ratio);
		}
	});

	it('says in words what each overall figure rests on: here every workload measures performance', () => {
		for (const { words, workloads, missing, aside } of byApi.overall) {
			expect([workloads.length, missing, aside]).toEqual([7, [], []]);
			expect(words).toMatch(/^The overall figure rests on performance alone: .+ and .+\.$/);
		}
	});

	it('is the same from a file as from a script, but for the rows it is made of', () => {
		const plain = (summary: CampaignSummary) =>
			summary.cells.map(({ flagged, ...cell }) => ({ ...cell, flagged: flagged.map((one) => one.value) }));
		expect(plain(byFile)).toEqual(plain(byApi));
		expect(byFile.overall).toEqual(byApi.overall);
	});

	it('holds the others against another profile when asked, the ratio turned round', () => {
		const forth = cellOf(byApi, 'huge-pages/prime-search').comparison?.ratio ?? 0;
		expect(byApi.baseline).toBe('stock');
		expect(cellOf(byApi, 'stock/prime-search').comparison).toBeNull();
		expect(forth).toBeCloseTo(1.04020383411, 10);
	});

	it('corrects the verdicts of all its comparisons together, and says of how many', () => {
		const held = byApi.cells.flatMap(({ comparison }) => comparison ?? []);
		expect([byApi.together, held.length]).toEqual([21, 21]);
		expect(held.filter(({ alone, verdict }) => verdict !== alone).map(({ verdict }) => verdict)).toEqual(
			held.flatMap(({ alone, verdict }) => (verdict === alone ? [] : ['not-enough' as const]))
		);
		// Holm's least step: what is beyond the band at 0.05 / 21 by itself stays beyond it in the table.
		const clear = held.filter(({ ci95 }) => ci95 && (ci95[1] < 0.9 || ci95[0] > 1.2));
		expect(clear.length).toBeGreaterThan(0);
		for (const { verdict, alone } of clear) expect(verdict).toBe(alone);
	});

	it('gives each overall figure an interval around it', () => {
		for (const { ratio, ci95 } of byApi.overall) {
			expect(ci95?.[0]).toBeLessThan(ratio);
			expect(ci95?.[1]).toBeGreaterThan(ratio);
		}
	});
});
