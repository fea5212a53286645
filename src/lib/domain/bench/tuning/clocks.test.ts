import { describe, expect, it } from 'vitest';
import { changePercent, clockMHz } from './clocks';

describe('clocks', () => {
	// Public worked examples of reference clock × ratio; the last by plain arithmetic.
	it.each([
		[100, 36, 3600],
		[133, 10, 1330],
		[200, 13, 2600],
		[100, 46, 4600],
		[100.5, 52, 5226]
	])('%d MHz × %d', (reference, ratio, mhz) => {
		expect(clockMHz(reference, ratio)).toBeCloseTo(mhz, 9);
	});

	it('gives a change in percent of what was before', () => {
		expect(changePercent(125, 100)).toBeCloseTo(25, 12);
		expect(changePercent(100, 125)).toBeCloseTo(-20, 12);
	});

	it('refuses what is not above zero', () => {
		expect(() => clockMHz(0, 36)).toThrow(RangeError);
		expect(() => clockMHz(100, Number.NaN)).toThrow(RangeError);
		expect(() => changePercent(1, 0)).toThrow(RangeError);
	});
});
