import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from './nearly.fixture';
import { geometricMean } from './geometric-mean';

// Inputs of Fleming & Wallace 1986, Table I, as remembered (two cells differ between copies): an illustration;
// what is tested are the invariants, which are exact.
const machines = {
	r: [417, 83, 66, 39449, 772],
	m: [244, 70, 153, 33527, 368],
	z: [134, 70, 135, 66000, 369]
};
const over = (a: number[], b: number[]) => a.map((value, index) => value / (b[index] ?? 1));

describe('the geometric mean', () => {
	it('of three rates', () => {
		expect(geometricMean([60, 30, 120])).toBeCloseTo(60, 11);
	});

	it('calls opposite ratios even, where the arithmetic mean calls each the slower', () => {
		const [a, b] = [
			[1, 1000],
			[10, 100]
		];
		expect(geometricMean(over(b, a))).toBeCloseTo(1, 14);
		expect(geometricMean(over(a, b))).toBeCloseTo(1, 14);
	});

	it('normalised to each machine of the table (computed)', () => {
		expect(geometricMean(over(machines.m, machines.r))).toBeCloseTo(0.8574, 4);
		expect(geometricMean(over(machines.z, machines.r))).toBeCloseTo(0.8498, 4);
		expect(geometricMean(over(machines.r, machines.m))).toBeCloseTo(1.1663, 4);
		expect(geometricMean(over(machines.m, machines.z))).toBeCloseTo(1.0089, 4);
	});

	const ratios = fc.array(fc.double({ min: 1e-3, max: 1e3, noNaN: true }), { minLength: 3, maxLength: 3 });

	it('gives ratios and a ranking that do not depend on the reference', () => {
		fc.assert(
			fc.property(ratios, ratios, ratios, (a, b, reference) => {
				const direct = geometricMean(over(a, b));
				const through = geometricMean(over(a, reference)) / geometricMean(over(b, reference));
				expect(relative(through, direct)).toBeLessThan(1e-12);
				expect(relative(geometricMean(over(b, a)), 1 / direct)).toBeLessThan(1e-12);
			})
		);
	});

	it('holds where a product would overflow or vanish', () => {
		expect(relative(geometricMean(Array.from({ length: 1000 }, () => 1e300)), 1e300)).toBeLessThan(1e-10);
		expect(relative(geometricMean(Array.from({ length: 1000 }, () => 1e-300)), 1e-300)).toBeLessThan(1e-10);
	});

	it('refuses what has none', () => {
		expect(() => geometricMean([])).toThrow(RangeError);
		expect(() => geometricMean([1, 0])).toThrow(RangeError);
		expect(() => geometricMean([1, -2])).toThrow(RangeError);
		expect(() => geometricMean([1, Number.POSITIVE_INFINITY])).toThrow(RangeError);
	});
});
