import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { byProfile, currentProfile, progress, restartsOf, toRun } from './progress';
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

describe('a list to run', () => {
	const plan = fc
		.record({
			profiles: fc.uniqueArray(fc.stringMatching(/^[a-e]{1,2}$/), { minLength: 1, maxLength: 8 }),
			workloads: fc.uniqueArray(fc.stringMatching(/^[v-z]{1,2}$/), { minLength: 1, maxLength: 8 })
		})
		.chain(({ profiles, workloads }) =>
			fc.record({
				cells: fc
					.array(
						fc.record({ needed: fc.integer({ min: 1, max: 9 }), taken: fc.integer({ min: 0, max: 12 }) }),
						{
							minLength: profiles.length * workloads.length,
							maxLength: profiles.length * workloads.length
						}
					)
					.map((counts) =>
						profiles.flatMap((profile, row) =>
							workloads.map((workload, column) => {
								const { needed = 1, taken = 0 } = counts[row * workloads.length + column] ?? {};
								return { profile, workload, needed, summary: taken === 0 ? null : { n: taken } };
							})
						)
					),
				current: fc.option(fc.constantFrom(...profiles, 'elsewhere'))
			})
		);
	const open = (cell: { needed: number; summary: { n: number } | null }) =>
		(cell.summary?.n ?? 0) < cell.needed;

	it('holds each unfinished cell once, with what it wants', () => {
		fc.assert(
			fc.property(plan, ({ cells, current }) => {
				const list = toRun(cells, current);
				const name = (cell: { profile: string; workload: string }) => `${cell.profile}/${cell.workload}`;
				expect(list.map(name).sort()).toEqual(cells.filter(open).map(name).sort());
				const { taken, needed } = progress(cells);
				expect(list.reduce((sum, cell) => sum + cell.remaining, 0)).toBe(needed - taken);
			})
		);
	});

	it('takes one restart for each unfinished profile but the one the rig is in', () => {
		fc.assert(
			fc.property(plan, ({ cells, current }) => {
				const profiles = new Set(cells.filter(open).map((cell) => cell.profile));
				expect(restartsOf(toRun(cells, current))).toBe(
					profiles.size - (current !== null && profiles.has(current) ? 1 : 0)
				);
			})
		);
	});

	it('is gathered by profile without losing any of it', () => {
		fc.assert(
			fc.property(plan, ({ cells, current }) => {
				const list = toRun(cells, current);
				const groups = byProfile(list);
				expect(new Set(groups.map((group) => group.profile)).size).toBe(groups.length);
				expect(groups.filter((group) => group.restart)).toHaveLength(restartsOf(list));
				expect(
					groups.flatMap(({ profile, cells: wanted }) => wanted.map((cell) => ({ profile, ...cell })))
				).toEqual(list.map(({ profile, workload, remaining }) => ({ profile, workload, remaining })));
			})
		);
	});
});
