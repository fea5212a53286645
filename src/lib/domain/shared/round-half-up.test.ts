import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { roundHalfUp } from './round-half-up';

describe('rounding a decimal text', () => {
	it.each([
		// ISO 80000-1 Annex B, rule B, and what IEEE doubles would make of it (computed with decimal arithmetic).
		['12.25', 1, '12.3'],
		['12.35', 1, '12.4'],
		['1.225', 2, '1.23'],
		['1225', -1, '1230'],
		['1235', -1, '1240'],
		['2.675', 2, '2.68'],
		['1.005', 2, '1.01'],
		['14.556', 1, '14.6'],
		['14.545', 1, '14.5'],
		// By magnitude, so that a sign changes nothing else.
		['-2.675', 2, '-2.68'],
		['-0.004', 2, '0.00'],
		['+3', 2, '3.00'],
		['1e-7', 7, '0.0000001'],
		['1.2345e3', 0, '1235'],
		['2.5E+3', -3, '3000'],
		['0.5', 0, '1'],
		['49', -2, '0'],
		['50', -2, '100']
	])('%s to %d places is %s', (text, places, rounded) => {
		expect(roundHalfUp(text, places)).toBe(rounded);
	});

	it('agrees with whole numbers divided by hand, and is within half a step', () => {
		fc.assert(
			fc.property(fc.integer({ min: -1e9, max: 1e9 }), fc.integer({ min: 0, max: 4 }), (whole, places) => {
				const text = `${whole}e-4`;
				const steps = BigInt(roundHalfUp(text, places).replace('.', ''));
				const left = steps * 10n ** BigInt(4 - places) - BigInt(whole);
				const twice = 2n * (left < 0n ? -left : left);
				expect(twice <= 10n ** BigInt(4 - places)).toBe(true);
				expect(roundHalfUp(roundHalfUp(text, places), places)).toBe(roundHalfUp(text, places));
			})
		);
	});

	it('refuses what is no decimal number', () => {
		for (const wrong of ['', 'NaN', 'Infinity', '1,5', '0x10', '1e', '.5', '1e9999']) {
			expect(() => roundHalfUp(wrong, 1)).toThrow(RangeError);
		}
		expect(() => roundHalfUp('1', 0.5)).toThrow(RangeError);
		expect(() => roundHalfUp('1', 5000)).toThrow(RangeError);
	});
});
