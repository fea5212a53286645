import { describe, expect, it } from 'vitest';
import { clockRatio } from './clock-ratio';

describe('clocks as one ratio', () => {
	// 6000 MT/s beside 3000 MHz is 1:1, beside 1500 MHz 1:2 (arithmetic; the naming is common practice).
	it.each([
		[[2000, 3000, 3000], '2 : 3 : 3', false],
		[[3000, 3000, 3000], '1 : 1 : 1', true],
		[[1500, 3000], '1 : 2', false],
		[[1800, 1800, 1800], '1 : 1 : 1', true],
		[[1333, 1333, 4000 / 3], '1 : 1 : 1', true],
		[[2033, 3000, 3000], '0.678 : 1 : 1', false]
	] as const)('%j', (clocks, text, together) => {
		expect(clockRatio(clocks)).toEqual({ text, together });
	});

	it('refuses what is not above zero', () => {
		expect(() => clockRatio([0, 3000])).toThrow(RangeError);
	});
});
