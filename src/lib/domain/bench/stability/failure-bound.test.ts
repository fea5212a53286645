import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from '../statistics/nearly.fixture';
import { failureBound, poissonUpper } from './failure-bound';

describe('upper bound of a Poisson mean', () => {
	// Garwood 1936, one-sided 95 % (four decimals); further digits SciPy 1.17.1: chi2.ppf(level, 2 * (k + 1)) / 2
	it.each([
		[0, 0.95, 2.9957322735539895],
		[1, 0.95, 4.743864518390577],
		[2, 0.95, 6.295793621871988],
		[3, 0.95, 7.753656527932725],
		[5, 0.95, 10.513034908741535],
		[10, 0.95, 16.962219235721903],
		[50, 0.95, 63.287074095747165],
		[200, 0.95, 224.87435104933058],
		[1000, 0.95, 1053.6031221333008],
		[0, 0.99, 4.60517018598809],
		[2, 0.99, 8.405946914885464],
		[20, 0.99, 33.10311814199661]
	])('%d seen, level %d', (k, level, published) => {
		expect(relative(poissonUpper(k, level), published)).toBeLessThan(1e-11);
	});

	it('refuses what has no answer', () => {
		expect(() => poissonUpper(-1)).toThrow(RangeError);
		expect(() => poissonUpper(1.5)).toThrow(RangeError);
		expect(() => poissonUpper(1, 1)).toThrow(RangeError);
	});
});

describe('what a record proves', () => {
	it.each([
		[
			14,
			0,
			'14 h without a failure: with 95 % confidence fewer than one failure in 4.7 h. It does not prove that there is none.'
		],
		[
			0.5,
			0,
			'0.5 h without a failure: with 95 % confidence fewer than one failure in 10 min. It does not prove that there is none.'
		],
		[
			1000,
			0,
			'1000 h without a failure: with 95 % confidence fewer than one failure in 334 h. It does not prove that there is none.'
		],
		[14, 1, '14 h with 1 failure: with 95 % confidence fewer than one failure in 3 h.'],
		[2.25, 2, '2.3 h with 2 failures: with 95 % confidence fewer than one failure in 21 min.']
	])('%d h, %d failures', (hours, failures, words) => {
		expect(failureBound(hours, failures).words.replaceAll('\u00a0', ' ')).toBe(words);
	});

	// SciPy 1.17.1, scipy.stats.chi2.ppf(0.95, 2) / 2 / 100: Poisson's upper bound after a hundred hours without a failure,
	// near the 3/n of the rule of three.
	it('is near the rule of three', () => {
		expect(failureBound(100, 0).perHour).toBeCloseTo(0.029957322735539894, 12);
	});

	it('falls with the hours and rises with the failures', () => {
		fc.assert(
			fc.property(fc.integer({ min: 1, max: 5000 }), fc.integer({ min: 0, max: 300 }), (hours, failures) => {
				const bound = failureBound(hours, failures).perHour;
				expect(bound).toBeGreaterThan(failures / hours);
				expect(failureBound(hours + 1, failures).perHour).toBeLessThan(bound);
				expect(failureBound(hours, failures + 1).perHour).toBeGreaterThan(bound);
			})
		);
	});

	it('refuses a record of no time', () => {
		expect(() => failureBound(0, 0)).toThrow(RangeError);
	});
});
