import { describe, expect, it } from 'vitest';
import { filterBoard, hiddenWords, isNoisy, type BoardFilter } from './board-filter';
import { summarise } from './statistics/summary';

const profiles = [
	{ slug: 'stock', name: 'Stock' },
	{ slug: 'by-hand', name: 'Tuned by hand' }
];
const workloads = [
	{ slug: 'render', class: 'all-core', leastDifferencePercent: 1 },
	{ slug: 'game', class: 'game', leastDifferencePercent: 2 }
] as const;
const cell = (profile: string, workload: string, values: number[], signedAt: string | null = null) => ({
	profile,
	workload,
	needed: 3,
	summary: values.length > 0 ? summarise(values) : null,
	signedAt
});
const board = {
	profiles,
	workloads,
	cells: [
		cell('stock', 'render', [100, 100.1, 100.2], '2026-11-01T00:00:00.000Z'),
		cell('stock', 'game', [60, 66, 63]),
		cell('by-hand', 'render', [110, 110.1, 110.2]),
		cell('by-hand', 'game', [])
	]
};
const shown = (filter: Partial<BoardFilter>) => {
	const found = filterBoard(board, { show: '', row: '', class: '', ...filter });
	return {
		...found,
		rows: found.rows.map(({ profile, cells }) => [
			profile.slug,
			...cells.map(({ cell: one, matches }) => `${one.workload}${matches ? '' : '?'}`)
		])
	};
};

describe('a filtered board', () => {
	it('is whole without a filter', () => {
		expect(shown({})).toMatchObject({
			rows: [
				['stock', 'render', 'game'],
				['by-hand', 'render', 'game']
			],
			hiddenProfiles: 0,
			hiddenWorkloads: 0,
			found: 4
		});
	});

	it('leaves out rows and columns without a match, and counts them', () => {
		expect(shown({ show: 'unfinished' })).toMatchObject({
			rows: [['by-hand', 'game']],
			hiddenProfiles: 1,
			hiddenWorkloads: 1,
			found: 1
		});
		// CV of 60, 66, 63 is 3 / 63 = 4.8 %, above the 2 % that matter; that of the renders is 0.1 %.
		expect(shown({ show: 'noisy' }).rows).toEqual([['stock', 'game']]);
		expect(shown({ show: 'flagged' })).toMatchObject({ rows: [], found: 0, hiddenProfiles: 2 });
	});

	it('keeps the cells beside a match, marked as none', () => {
		expect(shown({ show: 'unsigned' }).rows).toEqual([
			['stock', 'render?', 'game'],
			['by-hand', 'render', 'game']
		]);
	});

	it('goes by profile and class as well', () => {
		expect(shown({ row: ' HAND ' }).rows).toEqual([['by-hand', 'render', 'game']]);
		expect(shown({ class: 'game' }).rows).toEqual([
			['stock', 'game'],
			['by-hand', 'game']
		]);
	});

	it('says what it leaves out', () => {
		expect(hiddenWords({ hiddenProfiles: 0, hiddenWorkloads: 0 })).toBe('');
		expect(hiddenWords({ hiddenProfiles: 1, hiddenWorkloads: 0 })).toBe(
			'One profile without such a cell is not shown.'
		);
		expect(hiddenWords({ hiddenProfiles: 2, hiddenWorkloads: 3 })).toBe(
			'2 profiles and 3 workloads without such a cell are not shown.'
		);
	});

	it('an empty cell is not noisy', () => {
		expect(isNoisy({ summary: null }, workloads[0])).toBe(false);
	});
});
