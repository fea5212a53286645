import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fallsUnder } from './monotone-interpolation';

const line = [120, 130, 140, 150, 160, 170, 180].map((x, index) => ({
	x,
	y: [5500, 5500, 5477.5, 5477.5, 5425, 5350, 5300][index] ?? NaN
}));

describe('where a falling line falls under a value', () => {
	// R 4.2.2: approx on the fitted points
	it('between two points', () => {
		const crossing = fallsUnder(line, 5400);
		expect(crossing.kind === 'crosses' && crossing.at).toBeCloseTo(163.333333333, 9);
	});

	it('from the end of a level stretch on', () => {
		expect(fallsUnder(line, 5477.5)).toEqual({ kind: 'crosses', at: 150 });
		expect(fallsUnder(line, 5500)).toEqual({ kind: 'crosses', at: 130 });
	});

	it('never guesses beyond the ends', () => {
		expect(fallsUnder(line, 5250)).toEqual({ kind: 'not-reached' });
		expect(fallsUnder(line, 5300)).toEqual({ kind: 'not-reached' });
		expect(fallsUnder(line, 5501)).toEqual({ kind: 'always-below' });
	});

	it('finds the current of any clock on a straight line', () => {
		fc.assert(
			fc.property(fc.double({ min: 0.001, max: 99.999, noNaN: true }), (current) => {
				const crossing = fallsUnder(
					[0, 25, 60, 100].map((x) => ({ x, y: 5500 - 3 * x })),
					5500 - 3 * current
				);
				expect(crossing.kind === 'crosses' && crossing.at).toBeCloseTo(current, 8);
			})
		);
	});

	it('refuses what has no answer', () => {
		expect(() => fallsUnder([], 5)).toThrow(RangeError);
		expect(() => fallsUnder([...line, { x: 190, y: 5310 }], 5400)).toThrow(RangeError);
		expect(() => fallsUnder([...line, { x: 180, y: 5300 }], 5400)).toThrow(RangeError);
	});
});
