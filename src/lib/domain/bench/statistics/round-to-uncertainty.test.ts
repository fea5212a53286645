import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { roundToUncertainty } from './round-to-uncertainty';

describe('a value rounded to what its uncertainty supports', () => {
	it.each([
		// JCGM 100:2008, 7.2.6: 10.057 62 Ω with 27 mΩ is 10.058 Ω; 28.05 kHz is 28 kHz.
		[10.05762, 0.027, '10.058', '0.027'],
		[1000, 28.05, '1000', '28'],
		// NIST, examples of stating uncertainty: 100.021 47 g with 0.35 mg, and its double.
		[100.02147, 0.00035, '100.02147', '0.00035'],
		[100.02147, 0.0007, '100.02147', '0.00070'],
		// Five runs and a display step of 0.1: 99.20 ± 0.42 (computed).
		[99.2, 0.423477664, '99.20', '0.42'],
		// End gauge, GUM H.1, in nm.
		[50000837.9, 92.62, '50000838', '93'],
		[0.0123, 0.0996, '0.01', '0.10'],
		[2.675, 0.1, '2.68', '0.10'],
		[-2.675, 0.1, '-2.68', '0.10'],
		[123456, 1234, '123500', '1200'],
		[1.5e-9, 2.34e-11, '0.000000001500', '0.000000000023'],
		[0, 0.5, '0.00', '0.50']
	])('%d with %d', (value, uncertainty, rounded, roundedUncertainty) => {
		expect(roundToUncertainty(value, uncertainty)).toMatchObject({
			value: rounded,
			uncertainty: roundedUncertainty
		});
	});

	it('keeps one digit, if asked, where the first is 3 or more', () => {
		expect(roundToUncertainty(99.2, 0.42, { short: true })).toEqual({
			value: '99.2',
			uncertainty: '0.4',
			places: 1
		});
		expect(roundToUncertainty(99.2, 0.29, { short: true }).uncertainty).toBe('0.29');
		expect(roundToUncertainty(99.2, 0.96, { short: true })).toEqual({
			value: '99.2',
			uncertainty: '1.0',
			places: 1
		});
	});

	it('moves the value by half a step at most, and scales with powers of ten', () => {
		fc.assert(
			fc.property(fc.integer({ min: -99999, max: 99999 }), fc.integer({ min: 1, max: 999 }), (value, u) => {
				const plain = roundToUncertainty(value, u);
				const moved = Math.abs(Number(plain.value) - value);
				expect(moved).toBeLessThanOrEqual(0.5 * 10 ** -plain.places);
				const scaled = roundToUncertainty(Number(`${value}e3`), Number(`${u}e3`));
				expect(scaled.places).toBe(plain.places - 3);
				expect(Number(scaled.value)).toBeCloseTo(Number(plain.value) * 1000, 6);
			})
		);
	});

	it('refuses an uncertainty that is none', () => {
		for (const wrong of [0, -1, Number.NaN, Infinity])
			expect(() => roundToUncertainty(1, wrong)).toThrow(RangeError);
		expect(() => roundToUncertainty(Number.NaN, 1)).toThrow(RangeError);
	});
});
