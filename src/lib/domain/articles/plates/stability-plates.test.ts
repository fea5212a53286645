import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../../tests/fixtures/article-data';
import { platesAsk } from '../../../schemas/plate';
import { attempt, tried } from '../../bench/stability/attempt.fixture';
import { ladderOf } from '../../bench/stability/ladder.fixture';
import type { SweepFacts } from '../../bench/stability/sweep-facts';
import { moved } from '../../bench/stability/sweep.fixture';
import type { ArticleData } from '../data';
import { renderArticle } from '../render-article';
import { ladderSpec } from './ladder-spec';
import { plateCsv, plateTable } from './numbers';
import { sweepSpec } from './sweep-spec';

const ladder = ladderOf([
	...tried([4800], [4900]),
	attempt({ clockMHz: 4850, durationMin: 5 }),
	attempt({ clockMHz: 4875, outcome: 'stopped', durationMin: 2 }),
	attempt({ stress: 'tile-render', stressKind: 'everyday', clockMHz: 5000, packageW: 180.25 })
]);
const sweep: SweepFacts = {
	slug: 'switch',
	name: 'Switch',
	rig: ladder.rig,
	profile: ladder.profile,
	workload: { slug: 'tile-render', name: 'Tile render' },
	wantedMHz: 5400,
	stepA: 1,
	passes: [-1, 0, 1].map((byA, index) => ({
		number: index + 1,
		startedAt: '2026-11-11T09:30:00Z',
		points: moved(byA).map((point, at) => ({ threads: at + 1, ...point }))
	}))
};
const rowsOf = (csv: string) =>
	Papa.parse<Record<string, string>>(csv, { header: true, skipEmptyLines: true }).data;

describe('a plate of a ladder', () => {
	const spec = ladderSpec(ladder, 'Europe/Oslo');
	if (!spec) throw new Error('no plate');

	it('holds every attempt with what it shows, and the lowest voltage that passed', () => {
		expect(spec.series.map((one) => one.tries.map((a) => a.result))).toEqual([
			['passed', 'failed', 'short', 'stopped'],
			['passed']
		]);
		expect(spec.series[0]?.need).toEqual([{ clockMHz: 4800, volts: 1.25 }]);
		expect(ladderSpec(ladderOf([]), 'UTC')).toBeNull();
	});

	it('has its numbers as a table and, in full, as CSV', () => {
		expect(plateTable(spec)).toContain('passed, too short to count');
		expect(rowsOf(plateCsv(spec))).toMatchObject([
			{
				stress: 'long-sums',
				clock_mhz: '4800',
				volts: '1.25',
				result: 'passed',
				lowest_volts_passed: '1.25'
			},
			{ result: 'failed', failure: 'error', lowest_volts_passed: '' },
			{ result: 'short' },
			{ result: 'stopped' },
			{ stress: 'tile-render', package_w: '180.25' }
		]);
	});

	it('is what the editor’s page may ask to have drawn', () => {
		expect(platesAsk.parse({ specs: [spec] }).specs).toEqual([spec]);
	});
});

describe('a plate of a sweep', () => {
	const spec = sweepSpec(sweep, 'Europe/Oslo');
	if (!spec) throw new Error('no plate');

	it('holds every point, the fit and the crossing with its interval', () => {
		expect(spec.passes.map((pass) => pass.points.length)).toEqual([7, 7, 7]);
		expect(spec.crossingA).toBeCloseTo(163.3333, 3);
		// Student's t with 2 degrees of freedom is 4.30265 (NIST/SEMATECH e-Handbook 1.3.6.7.2); sd 1, so ± 4.30265/√3.
		expect(spec.ci95?.[1]).toBeCloseTo(163.3333 + 4.30265 / Math.sqrt(3), 3);
		expect(spec.answer.replaceAll('\u00a0', ' ')).toBe('163.3 A (160.8 to 165.8 A)');
	});

	it('says that it was not reached, or was below all along', () => {
		expect(sweepSpec({ ...sweep, wantedMHz: 5000 }, 'UTC')?.answer).toBe('not reached');
		expect(sweepSpec({ ...sweep, wantedMHz: 5600 }, 'UTC')?.answer).toBe('under it throughout');
		expect(sweepSpec({ ...sweep, passes: [] }, 'UTC')).toBeNull();
	});

	it('has its numbers as a table and as CSV, and may be drawn', () => {
		expect(plateTable(spec)).toContain('Pass 3');
		expect(rowsOf(plateCsv(spec))).toHaveLength(21);
		expect(platesAsk.parse({ specs: [spec] }).specs).toEqual([spec]);
	});
});

describe('their directives', () => {
	const data: ArticleData = { ...measuredArticle(), ladders: [ladder], sweeps: [sweep] };
	const rendered = (source: string, from = data) => renderArticle(source, from, () => '<svg></svg>');

	it('print the plate with its numbers', () => {
		const page = rendered('::plate{kind=ladder ladder=by-hand}\n\n::plate{kind=sweep}');
		expect(page.errors).toEqual([]);
		expect(page.plates.map(({ key }) => key.replace(/-[^-]+$/, ''))).toEqual([
			'ladder-by-hand',
			'sweep-switch'
		]);
		expect(page.html).toContain('Pass 1');
	});

	it('are errors with the nearest names where nothing is found', () => {
		expect(rendered('::plate{kind=ladder ladder=by-hands}').errors).toMatchObject([
			{ message: expect.stringContaining('by-hands'), nearest: ['by-hand'] }
		]);
		expect(rendered('::plate{kind=sweep sweep=x}').errors[0]?.message).toContain('There is switch');
		expect(rendered('::plate{kind=ladder}', measuredArticle()).errors[0]?.message).toContain('ladder yet');
	});
});
