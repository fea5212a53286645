import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { relative } from './nearly.fixture';
import { accuracySet, mavro, michelso, zarr13 } from './published.fixture';
import { summarise } from './summary';

describe('certified summaries (NIST StRD, univariate)', () => {
	it.each([
		['NumAcc1', [10000001, 10000003, 10000002], 10000002, 1, 1e-15, 1e-15],
		['NumAcc2', accuracySet(1.2, 1.1, 1.3), 1.2, 0.1, 1e-14, 1e-13],
		// The decimals of these two are not doubles: R's two passes reach 0.100000000034925 and 0.100000000558794.
		['NumAcc3', accuracySet(1000000.2, 1000000.1, 1000000.3), 1000000.2, 0.1, 1e-14, 1e-8],
		['NumAcc4', accuracySet(10000000.2, 10000000.1, 10000000.3), 10000000.2, 0.1, 1e-14, 1e-7],
		['Michelso', michelso, 299.8524, 0.0790105478190518, 1e-14, 1e-13],
		['Mavro', mavro, 2.001856, 0.000429123454003053, 1e-14, 1e-12]
	])('%s', (_, values, certifiedMean, certifiedSd, meanTolerance, sdTolerance) => {
		const summary = summarise(values);
		expect(relative(summary.mean, certifiedMean)).toBeLessThanOrEqual(meanTolerance);
		expect(relative(summary.sd ?? 0, certifiedSd)).toBeLessThanOrEqual(sdTolerance);
	});

	it('is not what a single pass would give', () => {
		const values = accuracySet(10000000.2, 10000000.1, 10000000.3);
		const sum = values.reduce((total, value) => total + value, 0);
		const squares = values.reduce((total, value) => total + value * value, 0);
		const onePass = Math.sqrt(Math.max(0, (squares - (sum * sum) / values.length) / (values.length - 1)));
		expect(relative(onePass, 0.1)).toBeGreaterThan(1e-3);
	});

	// The same data in R 4.2.2: median, range, t.test, sd / mean.
	it.each([
		['Mavro', mavro, 2.0018, 2.0013, 2.0027, 2.00173404446375, 2.00197795553625, 0.0214362798325],
		['Michelso', michelso, 299.85, 299.62, 300.07, 299.836722593166, 299.868077406834, 0.0263498133812],
		[
			'NumAcc1',
			[10000001, 10000003, 10000002],
			10000002,
			10000001,
			10000003,
			9999999.51586229,
			10000004.4841377,
			9.999998e-6
		]
	])('%s in R', (_, values, median, min, max, low, high, cvPercent) => {
		const summary = summarise(values);
		expect(summary).toMatchObject({ n: values.length, median, min, max });
		expect(relative(summary.ci95?.[0] ?? 0, low)).toBeLessThan(1e-13);
		expect(relative(summary.ci95?.[1] ?? 0, high)).toBeLessThan(1e-13);
		expect(relative(summary.cvPercent ?? 0, cvPercent)).toBeLessThan(1e-11);
	});
});

describe('a summary', () => {
	it('agrees with the heat-flow meter of the e-Handbook, §1.3.5.2', () => {
		// From the raw data, exactly; the handbook prints 9.261460, 0.02278881 and 9.258242 to 9.264679.
		const summary = summarise(zarr13);
		expect(summary.n).toBe(195);
		expect(summary.mean).toBeCloseTo(9.261460758974, 11);
		expect(summary.sd).toBeCloseTo(0.022788797425, 12);
		expect(summary.ci95?.[0]).toBeCloseTo(9.258242137329, 11);
		expect(summary.ci95?.[1]).toBeCloseTo(9.26467938062, 11);
		expect(summary).toMatchObject({ median: 9.261952, min: 9.196848, max: 9.327973 });
	});

	it('agrees with three readings of mercury', () => {
		// Boost.Math's documentation after Miller & Miller, 3rd ed. pp 54–55; the readings from Boost's example programs.
		const summary = summarise([38.9, 37.4, 37.1]);
		expect(summary.mean).toBeCloseTo(37.8, 12);
		expect(summary.sd).toBeCloseTo(0.964365076099, 11);
		expect(summary.ci95?.[0]).toBeCloseTo(35.40438, 5);
		expect(summary.ci95?.[1]).toBeCloseTo(40.19562, 5);
	});

	it('agrees with R 4.2.2 on five runs', () => {
		const summary = summarise([98.7, 99.4, 98.9, 99.9, 99.1]);
		expect(summary.sd).toBeCloseTo(0.469041575982, 11);
		expect(summary.cvPercent).toBeCloseTo(0.472824169337, 10);
		expect(summary.ci95?.[0]).toBeCloseTo(98.6176079614, 9);
		expect(summary.ci95?.[1]).toBeCloseTo(99.7823920386, 9);
		expect(summary.median).toBe(99.1);
	});

	it('puts the average in print that the protocol asks for', () => {
		expect(summarise([1, 2, 6]).headline).toBe(3);
		expect(summarise([1, 2, 6], 'median').headline).toBe(2);
	});

	it('knows what one reading cannot say', () => {
		expect(summarise([5])).toEqual({
			n: 1,
			mean: 5,
			median: 5,
			min: 5,
			max: 5,
			sd: null,
			cvPercent: null,
			ci95: null,
			flagged: [],
			headline: 5,
			medianLogError: null
		});
	});

	it('has no coefficient of variation where the mean is not above zero', () => {
		expect(summarise([-1, 1]).cvPercent).toBeNull();
		expect(summarise([-3, -1]).cvPercent).toBeNull();
	});

	it('refuses nothing at all, and what is not finite', () => {
		expect(() => summarise([])).toThrow(RangeError);
		expect(() => summarise([1, Number.NaN])).toThrow(RangeError);
		expect(() => summarise([1, Number.POSITIVE_INFINITY])).toThrow(RangeError);
	});

	const readings = fc.array(
		fc.integer({ min: 1, max: 1_000_000 }).map((whole) => whole / 1000),
		{ minLength: 2, maxLength: 40 }
	);

	it('does not depend on the order of the readings', () => {
		fc.assert(
			fc.property(readings, (values) => {
				const forth = summarise(values);
				const back = summarise([...values].reverse());
				expect(relative(back.mean, forth.mean)).toBeLessThan(1e-13);
				expect(back.median).toBe(forth.median);
				expect(Math.abs((back.sd ?? 0) - (forth.sd ?? 0))).toBeLessThan(1e-9);
			})
		);
	});

	it('moves with the readings: scaled by a power of two, every figure is scaled exactly', () => {
		fc.assert(
			fc.property(readings, (values) => {
				const once = summarise(values);
				const twice = summarise(values.map((value) => value * 2));
				expect(twice.mean).toBe(once.mean * 2);
				expect(twice.sd).toBe((once.sd ?? 0) * 2);
				expect(twice.cvPercent).toBe(once.cvPercent);
				expect(twice.flagged).toEqual(once.flagged);
			})
		);
	});

	it('lies between its least and its greatest reading', () => {
		fc.assert(
			fc.property(readings, (values) => {
				const { mean, median, min, max, ci95 } = summarise(values);
				const slack = max * 1e-14;
				for (const average of [mean, median]) {
					expect(average).toBeGreaterThanOrEqual(min - slack);
					expect(average).toBeLessThanOrEqual(max + slack);
				}
				expect(ci95?.[0]).toBeLessThanOrEqual(mean);
				expect(ci95?.[1]).toBeGreaterThanOrEqual(mean);
			})
		);
	});
});
