import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareSummaries } from './compare';
import { compareMany } from './compare-many';
import { holm } from './holm';
import { spread } from './sides';

const readings = fc.array(fc.double({ min: 90, max: 110, noNaN: true }), { minLength: 1, maxLength: 8 });
const rows = fc.array(
	fc.record({
		subject: fc.option(readings.map(spread)),
		baseline: fc.option(readings.map(spread)),
		better: fc.constantFrom('higher' as const, 'lower' as const),
		leastDifferencePercent: fc.double({ min: 0.1, max: 10, noNaN: true })
	}),
	{ maxLength: 25 }
);

describe('a table of comparisons', () => {
	it('holds, row by row, the comparison of that row alone', () => {
		fc.assert(
			fc.property(rows, (table) => {
				compareMany(table).forEach((result, index) => {
					const row = table[index];
					if (!row?.subject || !row.baseline) expect(result).toBeNull();
					else {
						expect(result?.comparison).toEqual(
							compareSummaries(row.subject, row.baseline, row.better, row.leastDifferencePercent)
						);
					}
				});
			})
		);
	});

	it("is corrected with Holm's p-values, and a verdict only ever falls to not enough", () => {
		fc.assert(
			fc.property(rows, (table) => {
				const results = compareMany(table);
				const tested = results.flatMap((result) => (result?.p ? [result] : []));
				expect(tested.map((row) => row.adjusted?.pDiffer)).toEqual(
					holm(tested.map((row) => row.p?.pDiffer ?? NaN))
				);
				expect(tested.map((row) => row.adjusted?.pEquivalent)).toEqual(
					holm(tested.map((row) => row.p?.pEquivalent ?? NaN))
				);
				for (const result of results) {
					if (result) expect([result.comparison.verdict, 'not-enough']).toContain(result.verdict);
				}
			})
		);
	});

	it('does not depend on the order of the rows', () => {
		fc.assert(
			fc.property(rows, (table) => {
				expect(compareMany([...table].reverse()).reverse()).toEqual(compareMany(table));
			})
		);
	});

	it('takes back a lucky row of many', () => {
		const still = { n: 5, mean: 100, sd: 2 };
		const row = (mean: number) => ({
			subject: { n: 5, mean, sd: 2 },
			baseline: still,
			better: 'higher' as const,
			leastDifferencePercent: 1
		});
		const alone = compareMany([row(104.2)]);
		const among = compareMany([row(104.2), ...Array.from({ length: 19 }, () => row(100))]);
		expect(alone[0]?.verdict).toBe('better');
		expect(among[0]).toMatchObject({ verdict: 'not-enough', comparison: { verdict: 'better' } });
	});

	it('has no ratio for means that are not above zero', () => {
		const zero = { n: 3, mean: 0, sd: 1 };
		const row = { subject: zero, baseline: zero, better: 'lower' as const, leastDifferencePercent: 1 };
		expect(compareMany([row])).toEqual([null]);
		expect(compareMany([])).toEqual([]);
	});
});
