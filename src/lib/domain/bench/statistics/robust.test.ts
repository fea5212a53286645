import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from './nearly.fixture';
import { compareMedians, hodgesLehmann, medianInterval } from './robust';

describe('the interval of a median', () => {
	// Coverage of order statistics, arithmetic of the binomial: 1 − 2 · P(X < k), n tosses.
	it.each([
		[6, 1, 62 / 64],
		[8, 1, 254 / 256],
		[9, 2, 1 - 20 / 512],
		[10, 2, 1 - 22 / 1024],
		[15, 4, 1 - (2 * (1 + 15 + 105 + 455)) / 32768]
	])('of %d readings lies between number %d from either end', (n, rank, coverage) => {
		const values = Array.from({ length: n }, (_, index) => index + 1);
		const interval = medianInterval(values);
		expect(interval.ci).toEqual([rank, n + 1 - rank]);
		expect(interval.coverage).toBeCloseTo(coverage, 12);
	});

	it('is none below six readings at 95 %, below five at 90 %', () => {
		expect(medianInterval([3, 1, 2, 5, 4])).toEqual({ median: 3, ci: null, coverage: null });
		expect(medianInterval([3, 1, 2, 5, 4], 0.9).ci).toEqual([1, 5]);
		expect(medianInterval([3, 1, 2, 4], 0.9).ci).toBeNull();
	});

	it('holds the median, at no less than its level', () => {
		fc.assert(
			fc.property(
				fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 60 }),
				(values) => {
					const { median, ci, coverage } = medianInterval(values);
					expect(ci === null).toBe(values.length < 6);
					if (!ci) return;
					expect(coverage).toBeGreaterThanOrEqual(0.95);
					expect(median).toBeGreaterThanOrEqual(ci[0]);
					expect(median).toBeLessThanOrEqual(ci[1]);
				}
			)
		);
	});
});

describe('Hodges–Lehmann', () => {
	it('Hollander & Wolfe, the example of ?wilcox.test (R 4.2.2)', () => {
		const x = [0.8, 0.83, 1.89, 1.04, 1.45, 1.38, 1.91, 1.64, 0.73, 1.46];
		const y = [1.15, 0.88, 0.9, 0.74, 1.21];
		expect(hodgesLehmann(x, y)).toBeCloseTo(0.305, 12);
	});
});

describe('a ratio of medians', () => {
	const [y1, y2] = [
		[36, 44, 47, 42, 49, 39, 46, 31, 33, 48],
		[32, 39, 26, 35, 43, 27, 40, 37, 34, 29, 49, 42, 40]
	];

	it('CRAN statpsych, ci.ratio.median2: 1.162162, 0.927667 to 1.455933 (its snapshot of test results)', () => {
		const { comparison } = compareMedians(y1, y2, 'higher', 1);
		expect(comparison.ratio).toBeCloseTo(1.162162, 6);
		expect(comparison.ci95?.[0]).toBeCloseTo(0.927667, 6);
		expect(comparison.ci95?.[1]).toBeCloseTo(1.455933, 6);
		expect(comparison.verdict).toBe('not-enough');
	});

	const side = fc.array(fc.double({ min: 90, max: 110, noNaN: true }), { minLength: 2, maxLength: 20 });
	const margin = fc.double({ min: 0.1, max: 20, noNaN: true });

	it('inverts with the sides and the direction, and minds neither order nor unit', () => {
		fc.assert(
			fc.property(side, side, margin, (a, b, m) => {
				const forth = compareMedians(a, b, 'higher', m).comparison;
				const turned = {
					better: 'worse',
					worse: 'better',
					'no-difference': 'no-difference',
					'not-enough': 'not-enough'
				};
				for (const back of [compareMedians(b, a, 'higher', m), compareMedians(a, b, 'lower', m)]) {
					expect(relative(back.comparison.ratio, 1 / forth.ratio)).toBeLessThan(1e-13);
					expect(relative(back.comparison.ci95?.[0] ?? NaN, 1 / (forth.ci95?.[1] ?? NaN))).toBeLessThan(
						1e-12
					);
					if (forth.ratio !== 1) expect(back.comparison.verdict).toBe(turned[forth.verdict]);
				}
				const scaled = compareMedians(
					[...a].reverse().map((value) => value * 1024),
					b.map((value) => value * 1024),
					'higher',
					m
				).comparison;
				expect(relative(scaled.ci95?.[0] ?? NaN, forth.ci95?.[0] ?? NaN)).toBeLessThan(1e-12);
			})
		);
	});

	it('says with p what its interval says', () => {
		fc.assert(
			fc.property(side, side, margin, (a, b, m) => {
				const { comparison, p } = compareMedians(a, b, 'higher', m);
				if (!comparison.ci95 || !p || Math.abs(p.pDiffer - 0.05) < 1e-9) return;
				const [low, high] = comparison.ci95;
				expect(p.pDiffer < 0.05).toBe(low > 1 + m / 100 || high < 1 / (1 + m / 100));
			})
		);
	});

	it('has no interval with one reading or a low end at zero; no doubt where nothing varies', () => {
		expect(compareMedians([5], y2, 'higher', 1)).toMatchObject({
			comparison: { ci95: null, verdict: 'not-enough' },
			p: null
		});
		expect(compareMedians([0, 5, 6], y2, 'higher', 1).comparison.ci95).toBeNull();
		expect(compareMedians([3, 3], [2, 2], 'higher', 1).comparison).toMatchObject({
			ci95: [1.5, 1.5],
			verdict: 'better'
		});
		expect(compareMedians([2, 2], [2, 2], 'higher', 1).comparison.verdict).toBe('no-difference');
	});

	it('refuses an empty side, no numbers, and medians not above zero', () => {
		expect(() => compareMedians([], y2, 'higher', 1)).toThrow(RangeError);
		expect(() => compareMedians([0, 0], y2, 'higher', 1)).toThrow(RangeError);
		expect(() => compareMedians([NaN], y2, 'higher', 1)).toThrow(RangeError);
	});
});
