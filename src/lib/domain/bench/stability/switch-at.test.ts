import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { switchAt } from './switch-at';

// Common practice, no source; the arithmetic by hand.
describe('the current to set', () => {
	it.each([
		[163.3, [160.3, 166.3], 1, 4, 159],
		[163.3, null, 1, 1, 162],
		[163.3, null, 5, 5, 155],
		[160, null, 0.1, 0.1, 159.9],
		[20, [-10, 50], 1, 31, null]
	] as const)('for %d A within %j in steps of %d A', (crossing, ci95, step, marginA, setA) => {
		const answer = switchAt(crossing, ci95, step);
		expect(answer.marginA).toBeCloseTo(marginA, 9);
		expect(answer.setA).toBe(setA);
	});

	it('is never above the lower end of the interval', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 1, max: 500, noNaN: true }),
				fc.double({ min: 0, max: 50, noNaN: true }),
				fc.constantFrom(0.125, 0.5, 1, 5),
				(crossing, half, step) => {
					const { setA } = switchAt(crossing, [crossing - half, crossing + half], step);
					if (setA !== null) expect(setA).toBeLessThanOrEqual(crossing - half);
				}
			)
		);
	});

	it('refuses a board without a step', () => {
		expect(() => switchAt(100, null, 0)).toThrow(RangeError);
	});
});
