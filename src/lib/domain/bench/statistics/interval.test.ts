import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from './nearly.fixture';
import { meanInterval, studentQuantile, twoSidedP } from './interval';

describe("Student's t", () => {
	// R 4.2.2: qt(c(.975, .95), df)
	it.each([
		[0.975, 1, 12.7062047362],
		[0.975, 2, 4.30265272975],
		[0.975, 3, 3.18244630528],
		[0.975, 4, 2.7764451052],
		[0.975, 5, 2.57058183564],
		[0.975, 6, 2.44691185114],
		[0.975, 7, 2.36462425159],
		[0.975, 8, 2.3060041352],
		[0.975, 9, 2.2621571628],
		[0.975, 10, 2.22813885199],
		[0.975, 30, 2.0422724563],
		[0.975, 100, 1.98397151852],
		[0.95, 1, 6.31375151468],
		[0.95, 2, 2.91998558035],
		[0.95, 3, 2.3533634348],
		[0.95, 4, 2.13184678633],
		[0.95, 9, 1.83311293266]
	])('quantile %d at %d degrees of freedom', (p, df, published) => {
		expect(relative(studentQuantile(p, df), published)).toBeLessThan(1e-11);
		expect(studentQuantile(1 - p, df)).toBeCloseTo(-published, 9);
	});

	it('comes to the normal quantile far out', () => {
		// R 4.2.2: qnorm(0.975)
		expect(studentQuantile(0.975, 1e9)).toBeCloseTo(1.95996398454, 7);
	});

	// R 4.2.2 t.test on AUTO83B, and on sleep; the first two also in Boost.Math's documentation.
	it.each([
		[-12.9462732749, 136.874976673, 1.57085e-25, 1e-5],
		[-12.620591, 326, 5.273e-30, 1e-4],
		[-1.86081346749, 17.7764735162, 0.0793941401874, 1e-10],
		[-1.97565832229, 2, 0.1868566019, 1e-9]
	])('p of t %d at %d degrees of freedom', (t, df, p, tolerance) => {
		expect(relative(twoSidedP(t, df), p)).toBeLessThan(tolerance);
	});

	it('quantile and tail undo each other', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 1e-6, max: 0.4999, noNaN: true }),
				fc.double({ min: 1, max: 1e5, noNaN: true }),
				(tail, df) => {
					expect(relative(twoSidedP(studentQuantile(1 - tail, df), df), 2 * tail)).toBeLessThan(1e-8);
				}
			)
		);
	});

	it('refuses what has no answer', () => {
		expect(() => studentQuantile(1, 3)).toThrow(RangeError);
		expect(() => studentQuantile(0.9, 0)).toThrow(RangeError);
		expect(() => meanInterval(1, 1, 1)).toThrow(RangeError);
		expect(() => twoSidedP(1, 0)).toThrow(RangeError);
	});
});

describe('interval of a mean', () => {
	// Boost.Math, "Calculating confidence intervals on the mean": e-Handbook §1.3.5.2 from its summary.
	it.each([
		[0.5, 9.26036, 9.26256],
		[0.75, 9.25958, 9.26334],
		[0.9, 9.25876, 9.26416],
		[0.95, 9.25824, 9.26468],
		[0.99, 9.25721, 9.26571],
		[0.999, 9.25601, 9.26691]
	])('at %d, heat-flow meter', (level, low, high) => {
		const [lower, upper] = meanInterval(9.26146, 0.02278881, 195, level);
		expect(lower).toBeCloseTo(low, 5);
		expect(upper).toBeCloseTo(high, 5);
	});

	// The same page, after Miller & Miller, Statistics for Analytical Chemistry, 3rd ed. pp 54–55.
	it.each([
		[0.9, 36.17422, 39.42578],
		[0.95, 35.40438, 40.19562],
		[0.99, 32.27408, 43.32592],
		[0.999, 20.20639, 55.39361]
	])('at %d, three readings of mercury', (level, low, high) => {
		const [lower, upper] = meanInterval(37.8, 0.964365, 3, level);
		expect(lower).toBeCloseTo(low, 4);
		expect(upper).toBeCloseTo(high, 4);
	});
});
