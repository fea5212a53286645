import { describe, expect, it } from 'vitest';
import { compareCells } from './compare';
import { headlineComparison } from './headline-comparison';
import { compareMedians } from './robust';

describe('a comparison by the headline of its protocol', () => {
	const [subject, baseline] = [
		[36, 44, 47, 42, 49, 39, 46, 31, 33, 48],
		[32, 39, 26, 35, 43, 27, 40, 37, 34, 29, 49, 42, 40]
	];

	it('goes by means or by medians', () => {
		expect(headlineComparison(subject, baseline, 'lower', 2, 'mean').comparison).toEqual(
			compareCells(subject, baseline, 'lower', 2)
		);
		expect(headlineComparison(subject, baseline, 'lower', 2, 'median')).toEqual(
			compareMedians(subject, baseline, 'lower', 2)
		);
	});

	it('is hardly moved by one wild reading where it goes by medians', () => {
		const wild = [...subject.slice(0, -1), 4800];
		const by = (headline: 'mean' | 'median') =>
			headlineComparison(wild, baseline, 'higher', 2, headline).comparison.ratio;
		expect(by('median')).toBeCloseTo(43 / 37, 12);
		expect(by('mean')).toBeGreaterThan(10);
	});
});
