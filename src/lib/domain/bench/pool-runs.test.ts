import { describe, expect, it } from 'vitest';
import { summariseCampaign } from './campaign';
import { type PooledRun, poolRuns } from './pool-runs';

const run = (given: Partial<PooledRun> & { day: number }): PooledRun => ({
	rig: 'n-12',
	rigName: 'N-12',
	profile: 'stock',
	profileName: 'Stock',
	parentId: null,
	workload: {
		slug: 'tile-render',
		name: 'Tile render',
		programVersion: '',
		settings: '',
		quantity: 'time',
		unit: 's',
		better: 'lower',
		class: 'all-core',
		headline: 'mean',
		leastDifferencePercent: 1,
		warmUps: 1,
		repeats: 3,
		coolDownS: 0
	},
	tester: 'Tomas Reyl',
	startedAt: new Date(Date.UTC(2026, 9, given.day)),
	ambientC: 21,
	values: [35, 35.2],
	...given
});

describe('runs of many campaigns as one matrix', () => {
	const tuned = { profile: 'fixed', profileName: 'Fixed', parentId: 1, values: [31, 31.1] };

	it('pools the runs of a cell, oldest first, stock before the others', () => {
		const pool = poolRuns([run({ day: 9, ...tuned }), run({ day: 5, values: [35.4] }), run({ day: 2 })]);
		expect(pool?.profiles.map(({ slug }) => slug)).toEqual(['stock', 'fixed']);
		const cells = pool ? summariseCampaign(pool.matrix).cells : [];
		expect(cells[0]?.summary?.n).toBe(3);
		expect(cells[0]).toMatchObject({ from: '2026-10-02T00:00:00.000Z', to: '2026-10-05T00:00:00.000Z' });
		expect(cells[1]?.comparison?.ratio).toBeCloseTo(35.2 / 31.05, 12);
	});

	it('tells the profiles of several rigs apart', () => {
		const pool = poolRuns([run({ day: 1 }), run({ day: 2, rig: 'm-4', rigName: 'M-4' })], 'n-12.stock');
		expect(pool?.profiles).toEqual([
			{ slug: 'm-4.stock', name: 'M-4, Stock' },
			{ slug: 'n-12.stock', name: 'N-12, Stock' }
		]);
		expect(pool?.matrix.baseline).toBe('n-12.stock');
	});

	it('is nothing without runs, and stock where nobody is named to hold against', () => {
		expect(poolRuns([])).toBeNull();
		expect(poolRuns([run({ day: 1 }), run({ day: 2, ...tuned })], 'gone')?.matrix.baseline).toBe('stock');
	});
});
