import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from '../statistics/nearly.fixture';
import { norris } from './norris.fixture';
import { leastSquares, predictAt } from './ols';

describe('a line by least squares', () => {
	// NIST StRD, Norris, certified values.
	it('Norris', () => {
		const fit = leastSquares(
			norris.map(({ x }) => x),
			norris.map(({ y }) => y)
		);
		expect(fit.n).toBe(36);
		expect(relative(fit.intercept, -0.262323073774029)).toBeLessThan(1e-11);
		expect(relative(fit.slope, 1.00211681802045)).toBeLessThan(1e-13);
		expect(relative(fit.interceptSe, 0.232818234301152)).toBeLessThan(1e-12);
		expect(relative(fit.slopeSe, 0.429796848199937e-3)).toBeLessThan(1e-12);
		expect(relative(fit.residualSd, 0.884796396144373)).toBeLessThan(1e-12);
		expect(relative(fit.rSquared ?? 0, 0.999993745883712)).toBeLessThan(1e-14);
		// R 4.2.2: predict(lm(y ~ x), data.frame(x = 500), interval = 'confidence'), and 'prediction'
		const { value, line95, reading95 } = predictAt(fit, 500);
		expect(value).toBeCloseTo(500.796085936, 8);
		expect(line95[0]).toBeCloseTo(500.488196472, 8);
		expect(line95[1]).toBeCloseTo(501.103975401, 8);
		expect(reading95[0]).toBeCloseTo(498.971794054, 8);
		expect(reading95[1]).toBeCloseTo(502.620377819, 8);
	});

	// R 4.2.2: lm(log(P) ~ log(f))
	it('a power law on logarithms', () => {
		const fit = leastSquares([3, 3.5, 4, 4.5, 5].map(Math.log), [45, 66, 93, 128, 172].map(Math.log));
		expect(fit.slope).toBeCloseTo(2.622017375617, 11);
		expect(Math.exp(fit.intercept)).toBeCloseTo(2.49154527023, 10);
		expect(fit.rSquared).toBeCloseTo(0.999372558208, 11);
	});

	it('leaves residuals that sum to nothing, also against x', () => {
		const points = fc.array(
			fc.record({
				x: fc.integer({ min: -1000, max: 1000 }),
				y: fc.double({ min: -1e4, max: 1e4, noNaN: true })
			}),
			{ minLength: 3, maxLength: 40 }
		);
		fc.assert(
			fc.property(points, (list) => {
				fc.pre(new Set(list.map(({ x }) => x)).size > 1);
				const { residuals } = leastSquares(
					list.map(({ x }) => x),
					list.map(({ y }) => y)
				);
				expect(residuals.reduce((sum, one) => sum + one, 0)).toBeCloseTo(0, 6);
				expect(residuals.reduce((sum, one, i) => sum + one * (list[i]?.x ?? 0), 0)).toBeCloseTo(0, 3);
			})
		);
	});

	it('has no R² where y does not vary', () => {
		expect(leastSquares([1, 2, 3], [7, 7, 7])).toMatchObject({ slope: 0, intercept: 7, rSquared: null });
	});

	it('refuses what has no answer', () => {
		expect(() => leastSquares([1, 2], [1, 2])).toThrow(RangeError);
		expect(() => leastSquares([2, 2, 2], [1, 2, 3])).toThrow(RangeError);
		expect(() => leastSquares([1, 2, 3], [1, 2])).toThrow(RangeError);
		expect(() => leastSquares([1, 2, NaN], [1, 2, 3])).toThrow(RangeError);
	});
});
