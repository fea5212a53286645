import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { testCell } from '../../../domain/bench/held-against';
import { summarise } from '../../../domain/bench/statistics/summary';
import { rememberedFigures } from './remembered-figures';

const rule = {
	slug: 'tile-render',
	unit: 's',
	better: 'lower' as const,
	headline: 'mean' as const,
	leastDifferencePercent: 1
};
const readings = fc.array(fc.double({ min: 0.1, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 8 });

describe('remembered figures', () => {
	it('are those that are worked out anew, the first time and every time, however few are kept', () => {
		fc.assert(
			fc.property(
				fc.array(readings, { minLength: 2, maxLength: 12 }),
				fc.integer({ min: 1, max: 20 }),
				(sets, most) => {
					const by = rememberedFigures(most);
					for (let round = 0; round < 2; round++) {
						for (const headline of ['mean', 'median'] as const) {
							const summaries = sets.map((values) => by.summarise(values, headline));
							expect(summaries).toEqual(sets.map((values) => summarise(values, headline)));
							const [baseline = summarise([1])] = summaries;
							for (const subject of summaries)
								expect(by.testCell(subject, baseline, { ...rule, headline })).toEqual(
									testCell(subject, baseline, { ...rule, headline })
								);
						}
					}
				}
			),
			{ numRuns: 50 }
		);
	});

	it('are the same object for the same readings, and apart for another rule', () => {
		const by = rememberedFigures(10);
		const [subject, baseline] = [by.summarise([1, 2, 3]), by.summarise([2, 3, 4])];
		expect(by.summarise([1, 2, 3])).toBe(subject);
		const tested = by.testCell(subject, baseline, rule);
		expect(by.testCell(subject, baseline, rule)).toBe(tested);
		const higher = by.testCell(subject, baseline, { ...rule, better: 'higher' });
		expect(higher.comparison?.ratio).toBeCloseTo(1 / (tested.comparison?.ratio ?? NaN), 12);
	});
});
