import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isotonic } from './isotonic';

const third = 10 / 3;
const scipy = [5.566666666667, 5.566666666667, 5.566666666667];

describe('isotonic fit', () => {
	it.each([
		// R 4.2.2: isoreg(c(…))$yf; the first is the example of ?isoreg
		['?isoreg', [1, 0, 4, 3, 3, 5, 4, 2, 0], [0.5, 0.5, 3, 3, 3, 3, 3, 3, 3]],
		['?isoreg, other end', [1, 0, 4, 3, 3, 5, 4, 2, 3], [0.5, 0.5, third, third, third, 3.5, 3.5, 3.5, 3.5]],
		['R', [5, 9, 1, 2, 5, 6, 6, 3, 8, 10], [4.25, 4.25, 4.25, 4.25, 5, 5, 5, 5, 8, 10]],
		// Busing 2022, J. Stat. Softw. 102(1), in SciPy's tests
		['Busing', [8, 4, 8, 2, 2, 0, 8], [4, 4, 4, 4, 4, 4, 8]],
		// SciPy's documentation of isotonic_regression
		[
			'SciPy',
			[1.5, 1.0, 4.0, 6.0, 5.7, 5.0, 7.8, 9.0, 7.5, 9.5, 9.0],
			[1.25, 1.25, 4, ...scipy, 7.8, 8.25, 8.25, 9.25, 9.25]
		]
	])('%s', (_, values, published) => {
		const fit = isotonic(values);
		expect(fit).toHaveLength(published.length);
		published.forEach((value, index) => {
			expect(fit[index]).toBeCloseTo(value, 11);
		});
		// The falling fit is the rising fit of the same values from behind.
		expect(isotonic(values.toReversed(), { direction: 'falling' }).toReversed()).toEqual(
			fit.map((value) => expect.closeTo(value, 11) as number)
		);
	});

	// SciPy 1.17.1: isotonic_regression([3, 1, 2, 5, 4], weights=[1, 2, 1, 3, 1])
	it('with weights', () => {
		const fit = isotonic([3, 1, 2, 5, 4], { weights: [1, 2, 1, 3, 1] });
		[5 / 3, 5 / 3, 2, 4.75, 4.75].forEach((value, index) => {
			expect(fit[index]).toBeCloseTo(value, 12);
		});
	});

	const weighted = fc.array(
		fc.record({
			value: fc.double({ min: -1e3, max: 1e3, noNaN: true }),
			weight: fc.double({ min: 0.1, max: 10, noNaN: true })
		}),
		{ minLength: 1, maxLength: 60 }
	);

	it('never falls, is its own fit, and keeps the weighted mean', () => {
		fc.assert(
			fc.property(weighted, fc.constantFrom('rising' as const, 'falling' as const), (list, direction) => {
				const weights = list.map(({ weight }) => weight);
				const fit = isotonic(
					list.map(({ value }) => value),
					{ weights, direction }
				);
				const sign = direction === 'rising' ? 1 : -1;
				fit.slice(1).forEach((value, index) => {
					expect(sign * (value - (fit[index] ?? 0))).toBeGreaterThanOrEqual(0);
				});
				isotonic(fit, { weights, direction }).forEach((value, index) => {
					expect(value).toBeCloseTo(fit[index] ?? NaN, 9);
				});
				const total = (values: number[]) =>
					values.reduce((sum, value, index) => sum + value * (weights[index] ?? 0), 0);
				expect(total(fit)).toBeCloseTo(total(list.map(({ value }) => value)), 6);
			})
		);
	});

	it('refuses what has no answer', () => {
		expect(() => isotonic([1, NaN])).toThrow(RangeError);
		expect(() => isotonic([1, 2], { weights: [1] })).toThrow(RangeError);
		expect(() => isotonic([1, 2], { weights: [1, 0] })).toThrow(RangeError);
		expect(isotonic([])).toEqual([]);
	});
});
