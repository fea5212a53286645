import { describe, expect, it } from 'vitest';
import { currentProfile, progress, toRun } from './progress';
import { summarise } from './statistics/summary';

const cell = (profile: string, workload: string, needed: number, taken: number) => ({
	profile,
	workload,
	needed,
	summary: taken === 0 ? null : summarise(Array.from({ length: taken }, () => 1))
});

describe('progress', () => {
	it('never counts more than a cell needs', () => {
		expect(progress([cell('stock', 'a', 3, 9), cell('stock', 'b', 3, 1), cell('tuned', 'a', 3, 0)])).toEqual({
			taken: 4,
			needed: 9
		});
		expect(progress([])).toEqual({ taken: 0, needed: 0 });
	});
});

describe('what to run next', () => {
	const cells = [
		cell('stock', 'a', 3, 3),
		cell('stock', 'b', 3, 1),
		cell('tuned', 'a', 3, 2),
		cell('tuned', 'b', 3, 0),
		cell('cool', 'a', 3, 3)
	];

	it('finishes the profile the rig is in before it changes to another', () => {
		expect(toRun(cells, 'tuned')).toEqual([
			{ profile: 'tuned', workload: 'a', remaining: 1, changesProfile: false },
			{ profile: 'tuned', workload: 'b', remaining: 3, changesProfile: false },
			{ profile: 'stock', workload: 'b', remaining: 2, changesProfile: true }
		]);
	});

	it('follows the campaign’s order from the start, and after a profile that is done', () => {
		for (const current of [null, 'cool']) {
			expect(
				toRun(cells, current).map(({ profile, workload, changesProfile }) => [
					profile,
					workload,
					changesProfile
				])
			).toEqual([
				['stock', 'b', true],
				['tuned', 'a', true],
				['tuned', 'b', false]
			]);
		}
	});

	it('is nothing when all is measured', () => {
		expect(toRun([cell('stock', 'a', 1, 1)], 'stock')).toEqual([]);
	});
});

describe('the profile the rig is in', () => {
	it('is that of the latest run', () => {
		expect(
			currentProfile([
				{ profile: 'stock', startedAt: '2026-05-01T10:00:00.000Z' },
				{ profile: 'tuned', startedAt: '2026-05-02T10:00:00.000Z' },
				{ profile: 'stock', startedAt: '2026-05-01T12:00:00.000Z' }
			])
		).toBe('tuned');
		expect(currentProfile([])).toBeNull();
	});
});
