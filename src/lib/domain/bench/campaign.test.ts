import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { countedReadings, summariseCampaign, type CampaignMatrix, type CampaignRun } from './campaign';
import type { WorkloadFacts } from './figures';
import { welch } from './statistics/welch';
import { relative } from './statistics/nearly.fixture';

const workload = (slug: string, given: Partial<WorkloadFacts> = {}): WorkloadFacts & { needed: number } => ({
	slug,
	name: slug,
	programVersion: '',
	settings: '',
	quantity: 'throughput',
	unit: 'events/s',
	better: 'higher',
	class: 'all-core',
	headline: 'mean',
	leastDifferencePercent: 1,
	warmUps: 1,
	repeats: 3,
	coolDownS: 0,
	needed: 3,
	...given
});

const run = (
	profile: string,
	slug: string,
	values: number[],
	given: Partial<CampaignRun> = {}
): CampaignRun => ({
	profile,
	workload: slug,
	tester: 'Ilse Marlow',
	startedAt: '2026-05-01T10:00:00.000Z',
	ambientC: null,
	voided: false,
	readings: values.map((value) => ({ value, excluded: false })),
	...given
});

const matrix = (given: Partial<CampaignMatrix>): CampaignMatrix => ({
	profiles: ['stock', 'tuned'],
	workloads: [workload('tile-render')],
	runs: [],
	signatures: [],
	baseline: 'stock',
	...given
});

describe('a campaign', () => {
	it('has a figure for every cell, empty ones too', () => {
		const { cells, overall } = summariseCampaign(matrix({ runs: [run('stock', 'tile-render', [1, 2])] }));
		expect(
			cells.map(({ profile, summary, comparison }) => [profile, summary?.n ?? null, comparison])
		).toEqual([
			['stock', 2, null],
			['tuned', null, null]
		]);
		expect(overall).toEqual({});
	});

	it('counts neither excluded readings nor voided runs', () => {
		const runs = [
			run('stock', 'tile-render', [10, 12]),
			run('stock', 'tile-render', [99], { voided: true, tester: 'Someone else', ambientC: 40 }),
			run('stock', 'tile-render', [], {
				readings: [
					{ value: 500, excluded: true },
					{ value: 14, excluded: false }
				]
			})
		];
		expect(countedReadings(runs).map(({ value }) => value)).toEqual([10, 12, 14]);
		const [cell] = summariseCampaign(matrix({ runs })).cells;
		expect(cell).toMatchObject({ summary: { n: 3, mean: 12 }, testers: ['Ilse Marlow'], ambientC: null });
	});

	it('says who, when, how warm, and who signed', () => {
		const runs = [
			run('stock', 'tile-render', [1], { startedAt: '2026-05-02T08:00:00.000Z', ambientC: 21 }),
			run('stock', 'tile-render', [1], {
				startedAt: '2026-05-01T08:00:00.000Z',
				ambientC: 23,
				tester: 'Odd Hollin'
			})
		];
		const signatures = [
			{
				profile: 'stock',
				workload: 'tile-render',
				signedBy: 'Odd Hollin',
				signedAt: '2026-05-03T08:00:00.000Z'
			}
		];
		const [cell, other] = summariseCampaign(matrix({ runs, signatures })).cells;
		expect(cell).toMatchObject({
			testers: ['Ilse Marlow', 'Odd Hollin'],
			from: '2026-05-01T08:00:00.000Z',
			to: '2026-05-02T08:00:00.000Z',
			ambientC: 22,
			signedBy: 'Odd Hollin',
			signedAt: '2026-05-03T08:00:00.000Z'
		});
		expect(other).toMatchObject({ testers: [], from: null, to: null, signedBy: null });
	});

	it('holds each profile against the baseline that is named', () => {
		const runs = [run('stock', 'tile-render', [100, 100]), run('tuned', 'tile-render', [110, 110])];
		expect(summariseCampaign(matrix({ runs })).overall.tuned?.ratio).toBeCloseTo(1.1, 12);
		expect(summariseCampaign(matrix({ runs, baseline: 'tuned' })).overall.stock?.ratio).toBeCloseTo(
			1 / 1.1,
			12
		);
		expect(() => summariseCampaign(matrix({ runs, baseline: 'nothing' }))).toThrow(RangeError);
	});

	it('has no ratio where a mean is not above zero', () => {
		const runs = [run('stock', 'tile-render', [0, 0]), run('tuned', 'tile-render', [1, 2])];
		const { cells, overall } = summariseCampaign(matrix({ runs }));
		expect(cells[1]?.comparison).toBeNull();
		expect(overall).toEqual({});
	});

	it('does not mix up cells whose names run together', () => {
		const runs = [run('a', 'b', [1]), run('a-b', 'b', [2])];
		const { cells } = summariseCampaign(
			matrix({ profiles: ['a', 'a-b'], workloads: [workload('b')], baseline: 'a', runs })
		);
		expect(cells.map((cell) => cell.summary?.mean)).toEqual([1, 2]);
	});
});

describe('the measured readings against R 4.2.2', () => {
	// tests/fixtures/reference.txt, made by `Rscript reference.R` beside readings.csv; R printed 12 digits.
	const rows = readFileSync('tests/fixtures/readings.csv', 'utf8')
		.trim()
		.split('\n')
		.slice(1)
		.map((line) => line.split(','));
	const reference = readFileSync('tests/fixtures/reference.txt', 'utf8').split('\n');
	const section = (header: string) => {
		const from = reference.findIndex((line) => line.startsWith(header)) + 1;
		const length = reference
			.slice(from)
			.findIndex((line) => line.startsWith('profile,') || line.startsWith('frames-'));
		return reference.slice(from, from + length).map((line) => line.split(','));
	};
	const names = (column: number) => [...new Set(rows.map((row) => row[column] ?? ''))];
	const valuesOf = (profile: string, slug: string) =>
		rows.filter((row) => row[0] === profile && row[1] === slug).map((row) => Number(row[6]));
	const workloads = names(1).map((slug) =>
		workload(slug, { better: rows.find((row) => row[1] === slug)?.[3] === 'lower' ? 'lower' : 'higher' })
	);
	const { cells, overall } = summariseCampaign({
		profiles: names(0),
		workloads,
		runs: rows.map(([profile = '', slug = '', , , , , value]) => run(profile, slug, [Number(value)])),
		signatures: [],
		baseline: 'stock'
	});
	const cellOf = (profile = '', slug = '') =>
		cells.find((cell) => cell.profile === profile && cell.workload === slug);
	const agree = (ours: (number | null | undefined)[], printed: string[]) => {
		expect(ours).toHaveLength(printed.length);
		for (const [index, figure] of ours.entries()) {
			expect(relative(figure ?? Number.NaN, Number(printed[index]))).toBeLessThan(1e-11);
		}
	};

	const summaries = section('profile,workload,n,');
	const ratios = section('profile,workload,ratio');
	const means = section('profile,geometric');

	it('is compared with every figure R printed', () => {
		expect([summaries.length, ratios.length, means.length]).toEqual([28, 21, 3]);
	});

	it.each(summaries)('%s %s: n, mean, median, sd, cv, interval', (profile, slug, ...printed) => {
		const summary = cellOf(profile, slug)?.summary;
		agree(
			[summary?.n, summary?.mean, summary?.median, summary?.sd, summary?.cvPercent, ...(summary?.ci95 ?? [])],
			printed
		);
	});

	it.each(ratios)('%s over stock, %s: ratio, Welch', (profile = '', slug = '', ...printed) => {
		const { t, df, p } = welch(valuesOf(profile, slug), valuesOf('stock', slug));
		agree([cellOf(profile, slug)?.comparison?.ratio, t, df, p], printed);
	});

	it.each(means)('%s: geometric mean of ratios', (profile = '', printed = '') => {
		agree([overall[profile]?.ratio], [printed]);
		expect(overall[profile]?.workloads).toHaveLength(7);
	});

	it('finds the one workload that the cipher instructions move', () => {
		const worse = cells.filter(
			(cell) => cell.profile === 'no-vector-crypto' && (cell.comparison?.ratio ?? 1) < 0.5
		);
		expect(worse.map((cell) => [cell.workload, cell.comparison?.verdict])).toEqual([
			['aes-gcm-16k', 'worse']
		]);
	});
});
