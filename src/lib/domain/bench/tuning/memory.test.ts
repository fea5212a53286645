import { describe, expect, it } from 'vitest';
import {
	clockPeriodNs,
	dataRateMTs,
	memoryClockMHz,
	peakBandwidthMBs,
	synchronous,
	wordLatencyNs
} from './memory';

describe('memory arithmetic', () => {
	// Peak MB/s to 5600 MT/s as in the modules' public names (PC4-12800 … PC5-44800); the rest by the formulas.
	it.each([
		[1600, 800, 1.25, 12800],
		[2400, 1200, 0.83333333, 19200],
		[3200, 1600, 0.625, 25600],
		[4800, 2400, 0.41666667, 38400],
		[5200, 2600, 0.38461538, 41600],
		[5600, 2800, 0.35714286, 44800],
		[6000, 3000, 0.33333333, 48000],
		[8000, 4000, 0.25, 64000]
	])('%d MT/s', (rate, mhz, periodNs, peak) => {
		expect(memoryClockMHz(rate)).toBe(mhz);
		expect(dataRateMTs(mhz)).toBe(rate);
		expect(clockPeriodNs(rate)).toBeCloseTo(periodNs, 8);
		expect(peakBandwidthMBs(rate)).toBe(peak);
	});

	it('keeps thirds of a megahertz', () => {
		// Module names PC4-21333 and PC4-23466 (public listings) are these, cut off.
		expect(peakBandwidthMBs(8000 / 3)).toBeCloseTo(21333.3, 1);
		expect(peakBandwidthMBs(8800 / 3)).toBeCloseTo(23466.7, 1);
		expect(memoryClockMHz(8000 / 3)).toBeCloseTo(1333.33, 2);
	});

	// 2000 × CL ÷ MT/s and 1000 ÷ MT/s a word after it: the formula from public listings, the values computed from it.
	it.each([
		[1600, 11, 13.75, 15.625, 18.125],
		[3200, 16, 10, 10.9375, 12.1875],
		[3200, 22, 13.75, 14.6875, 15.9375],
		[3600, 18, 10, 10.8333, 11.9444],
		[4800, 40, 16.6667, 17.2917, 18.125],
		[6000, 30, 10, 10.5, 11.1667],
		[6400, 32, 10, 10.46875, 11.09375],
		[8000, 38, 9.5, 9.875, 10.375]
	])('%d MT/s CL%d: first, fourth and eighth word', (rate, cas, first, fourth, eighth) => {
		expect(wordLatencyNs(rate, cas)).toBeCloseTo(first, 4);
		expect(wordLatencyNs(rate, cas, 4)).toBeCloseTo(fourth, 4);
		expect(wordLatencyNs(rate, cas, 8)).toBeCloseTo(eighth, 4);
	});

	it('knows which clocks run as one', () => {
		expect(synchronous(memoryClockMHz(6000), 3000)).toBe(true);
		expect(synchronous(memoryClockMHz(6000), 1500)).toBe(false);
		expect(synchronous(memoryClockMHz(3600), 1800)).toBe(true);
		expect(synchronous(memoryClockMHz(8000 / 3), 1333)).toBe(true);
	});

	it('refuses what is not above zero', () => {
		expect(() => memoryClockMHz(0)).toThrow(RangeError);
		expect(() => wordLatencyNs(6000, -1)).toThrow(RangeError);
		expect(() => peakBandwidthMBs(Number.POSITIVE_INFINITY)).toThrow(RangeError);
	});
});
