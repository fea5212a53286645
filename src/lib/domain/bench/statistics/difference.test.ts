import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareDifference } from './difference';
import { relative } from './nearly.fixture';
import { spread } from './sides';

// CRAN TOSTER, test-NCSS1; R 4.2.2.
const first = spread([452, 874, 554, 447, 356, 754, 558, 574, 664, 682, 547, 435, 245]);
const second = spread([546, 547, 774, 465, 459, 665, 467, 365, 589, 534, 456, 651, 654, 665, 546, 537]);

describe('a comparison by difference', () => {
	it('is equivalent within 110 (CRAN TOSTER, test-NCSS1, Welch)', () => {
		const { difference, ci95, p, verdict } = compareDifference(first, second, 'higher', 110);
		expect(difference).toBeCloseTo(-8.1153846, 7);
		expect(ci95?.[0]).toBeCloseTo(-120.27336, 5);
		expect(ci95?.[1]).toBeCloseTo(104.04259, 5);
		expect(p?.pEquivalent).toBeCloseTo(0.03628, 5);
		expect(verdict).toBe('no-difference');
		// The 90 % interval, −100.787 to 84.556, crosses 100.
		expect(compareDifference(first, second, 'higher', 100).verdict).toBe('not-enough');
	});

	it('sleep (Student 1908; R 4.2.2): p of no difference at all', () => {
		const one = spread([0.7, -1.6, -0.2, -1.2, -0.1, 3.4, 3.7, 0.8, 0, 2]);
		const two = spread([1.9, 0.8, 1.1, 0.1, -0.1, 4.4, 5.5, 1.6, 4.6, 3.4]);
		const { ci95, p, verdict } = compareDifference(one, two, 'lower', 0);
		expect(ci95?.[0]).toBeCloseTo(-0.205483230712, 11);
		expect(ci95?.[1]).toBeCloseTo(3.365483230712, 11);
		expect(p?.pDiffer).toBeCloseTo(0.0793941401874, 11);
		expect(verdict).toBe('not-enough');
	});

	it('calls the cooler one better where lower is', () => {
		const [cool, warm] = [spread([71, 72, 71.5]), spread([80, 81, 80.4])];
		expect(compareDifference(cool, warm, 'lower', 2)).toMatchObject({ verdict: 'better' });
		expect(compareDifference(cool, warm, 'higher', 2)).toMatchObject({ verdict: 'worse' });
		expect(compareDifference(cool, warm, 'lower', 2).difference).toBeCloseTo(9.3 - 0.3333333333, 8);
	});

	const readings = fc
		.array(fc.double({ min: -40, max: 110, noNaN: true }), { minLength: 2, maxLength: 10 })
		.filter((values) => Math.max(...values) - Math.min(...values) > 0.01);

	it('does not mind another zero, turns with the sides, and scales with the unit', () => {
		fc.assert(
			fc.property(readings, readings, fc.double({ min: -300, max: 300, noNaN: true }), (a, b, shift) => {
				const plain = compareDifference(spread(a), spread(b), 'higher', 3);
				const moved = (values: number[]) => spread(values.map((value) => 1.8 * value + shift));
				const shifted = compareDifference(moved(a), moved(b), 'higher', 3 * 1.8);
				expect(Math.abs(shifted.difference - 1.8 * plain.difference)).toBeLessThan(1e-9);
				expect(relative(shifted.p?.pDiffer ?? NaN, plain.p?.pDiffer ?? NaN)).toBeLessThan(1e-6);
				const back = compareDifference(spread(b), spread(a), 'higher', 3);
				expect(back.difference).toBe(-plain.difference);
				expect(compareDifference(spread(a), spread(b), 'lower', 3)).toEqual(back);
			})
		);
	});

	it('has no interval with one reading, and no doubt where nothing varies', () => {
		expect(compareDifference(spread([3]), second, 'higher', 1)).toMatchObject({
			ci95: null,
			verdict: 'not-enough'
		});
		const still = (value: number) => spread([value, value]);
		expect(compareDifference(still(5), still(3), 'higher', 1)).toMatchObject({
			ci95: [2, 2],
			verdict: 'better'
		});
		expect(compareDifference(still(3), still(3), 'higher', 1).verdict).toBe('no-difference');
	});

	it('refuses a least difference below zero and a mean that is no number', () => {
		expect(() => compareDifference(first, second, 'higher', -1)).toThrow(RangeError);
		expect(() => compareDifference(first, second, 'higher', Number.NaN)).toThrow(RangeError);
		expect(() => compareDifference({ ...first, mean: Infinity }, second, 'higher', 1)).toThrow(RangeError);
	});
});
