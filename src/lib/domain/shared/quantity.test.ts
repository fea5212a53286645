import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import {
	decimalsFor,
	printed,
	printedGain,
	printedGainRange,
	printedPercent,
	printedRange,
	printedRatio,
	printedSigned,
	printedWithUnit,
	roundedDecimal
} from './quantity';

describe('rounding on the decimal digits', () => {
	// ISO 80000-1 Annex B, rule B, as worked in a public note on the JIS Z 8401 / ISO rule (the rule A answers of
	// that note differ only at exact halves: 14.45, 1000.5), and recomputed with decimal arithmetic.
	it.each([
		[14.556, 1, '14.6'],
		[14.545, 1, '14.5'],
		[14.55, 1, '14.6'],
		[14.45, 1, '14.5'],
		[1000.5, 0, '1001'],
		[1001.5, 0, '1002'],
		[12.25, 1, '12.3'],
		[12.35, 1, '12.4'],
		[1.225, 2, '1.23'],
		[1225, -1, '1230'],
		[1235, -1, '1240']
	])('%d to %d decimals is %s', (value, decimals, text) => {
		expect(roundedDecimal(value, decimals)).toBe(text);
	});

	// The known trap of IEEE doubles: (2.675).toFixed(2) is 2.67 and (1.005).toFixed(2) is 1.00.
	it('is not caught by binary halves', () => {
		expect(roundedDecimal(2.675, 2)).toBe('2.68');
		expect(roundedDecimal(1.005, 2)).toBe('1.01');
		expect(roundedDecimal(-2.675, 2)).toBe('-2.68');
	});

	it('carries, pads and keeps nought unsigned', () => {
		expect(roundedDecimal(9.999, 2)).toBe('10.00');
		expect(roundedDecimal(0.05, 3)).toBe('0.050');
		expect(roundedDecimal(-0.04, 1)).toBe('0.0');
		expect(roundedDecimal(1e21, 0)).toBe('1000000000000000000000');
		expect(roundedDecimal(1.5e-7, 7)).toBe('0.0000002');
		expect(roundedDecimal(4, -1)).toBe('0');
	});

	it('refuses what is not a number', () => {
		expect(() => roundedDecimal(Number.NaN, 1)).toThrow(RangeError);
		expect(() => roundedDecimal(Infinity, 1)).toThrow(RangeError);
	});

	it('never moves a value by more than half a place', () => {
		fc.assert(
			fc.property(
				fc.double({ min: -1e9, max: 1e9, noNaN: true }),
				fc.integer({ min: -3, max: 6 }),
				(v, d) => {
					const error = Math.abs(Number(roundedDecimal(v, d)) - v);
					expect(error).toBeLessThanOrEqual(0.5 * 10 ** -d * (1 + 1e-9) + Math.abs(v) * 1e-15);
				}
			)
		);
	});
});

describe('digits from the uncertainty', () => {
	// JCGM 100:2008 (GUM) 7.2.6: y = 10.057 62 Ω with u = 27 mΩ is printed 10.058 Ω.
	it('prints 10.057 62 Ω with 27 mΩ as 10.058', () => {
		expect(printed(10.05762, { halfWidth: 0.027 })).toBe('10.058');
	});
	// GUM 7.2.6: 28.05 kHz becomes 28 kHz.
	it('prints an uncertainty of 28.05 kHz as 28', () => {
		expect(printed(28.05, { halfWidth: 28.05 })).toBe('28');
	});
	// NIST, physics.nist.gov/cuu/Uncertainty/examples.html: m = (100.021 47 ± 0.000 70) g.
	it('prints 100.021 47 with 0.000 70', () => {
		expect(printed(100.02147, { halfWidth: 0.0007 })).toBe('100.02147');
	});
	// outside-checks 7.4, five runs: 99.20 ± 0.42.
	it('prints 99.2 with 0.42 as 99.20', () => {
		expect(printed(99.2, { halfWidth: 0.42 })).toBe('99.20');
	});
	it('reads the place after rounding: 9.96 is 10, not 10.0', () => {
		expect(decimalsFor(123.4, { halfWidth: 9.96 })).toBe(0);
	});
	it('keeps two digits of a value that is smaller than its uncertainty', () => {
		expect(printed(5.04, { halfWidth: 120 })).toBe('5.0');
	});
	it('prints a single reading as it was measured', () => {
		expect(printed(31.25)).toBe('31.25');
		expect(printed(4686.72428571)).toBe('4686.72');
		expect(printed(0)).toBe('0');
	});
});

describe('setting', () => {
	it('uses a true minus, spaces between thousands and an unbreakable space before the unit', () => {
		expect(printedWithUnit(-4.56, '%', { decimals: 1 })).toBe('\u22124.6\u00a0%');
		expect(printed(3322298.25857, { halfWidth: 295256 })).toBe('3\u00a0320\u00a0000');
		expect(printed(4687)).toBe('4687');
		expect(printedWithUnit(45, '°')).toBe('45°');
		expect(printedWithUnit(85, '°C')).toBe('85\u00a0°C');
		expect(printedWithUnit(12, '')).toBe('12');
	});
	it('signs gains, and nought not', () => {
		expect(printedGain(12.43, [11.8, 13])).toBe('+12.4\u00a0%');
		expect(printedGain(-4.56)).toBe('\u22124.6\u00a0%');
		expect(printedGain(-0.04)).toBe('0.0\u00a0%');
		expect(printedGain(130.4, [90, 170])).toBe('+130\u00a0%');
		expect(printedSigned(0.4, { decimals: 0 })).toBe('0');
	});
	it('prints ranges to one place, with "to"', () => {
		expect(printedRange([4621.54280534, 4751.90576609])).toBe('4622 to 4752');
		expect(printedGainRange([-5.04, -4.2])).toBe('\u22125.0 to \u22124.2\u00a0%');
		expect(printedGainRange([-0.8, 2.4])).toBe('\u22120.8 to +2.4\u00a0%');
	});
	it('prints percents and ratios', () => {
		expect(printedPercent(1.50378417457)).toBe('1.5\u00a0%');
		expect(printedRatio(1.0752429725)).toBe('1.075');
	});
});
