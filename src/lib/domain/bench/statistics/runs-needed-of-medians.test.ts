import { describe, expect, it } from 'vitest';
import { readingsFrom, uniformFrom } from './coverage.fixture';
import { compareMedians, expectedMedianError, logMedianError } from './robust';
import { runsNeededOfMedians } from './runs-needed-of-medians';

const cv = 0.01;
/** A set of ten whose error is what normal readings of 1 % scatter give on the average. */
const of = (median: number, scatter = cv, n = 10) => ({
	n,
	median,
	logError: scatter * expectedMedianError(n)
});
const perSideOf = (needed: ReturnType<typeof runsNeededOfMedians>): number =>
	needed.kind === 'runs' ? needed.perSide : NaN;

describe('the error of a median to expect', () => {
	it('SciPy 1.17.1, √(π/2) = 1.2533141373 in shares of √n, for many readings', () => {
		expect(expectedMedianError(900) * Math.sqrt(900)).toBeCloseTo(1.2533141373, 2);
	});

	it.each([3, 5, 7, 10, 20])('is the average of %i simulated readings', (n) => {
		const readings = readingsFrom(uniformFrom(20261201 + n));
		const campaigns = 3000;
		let sum = 0;
		for (let i = 0; i < campaigns; i += 1) sum += logMedianError(readings(n, 1, cv)) ?? NaN;
		expect(sum / campaigns / cv / expectedMedianError(n)).toBeGreaterThan(0.96);
		expect(sum / campaigns / cv / expectedMedianError(n)).toBeLessThan(1.04);
	});
});

describe('how many more readings would settle a comparison of medians', () => {
	// Ratio, least difference that matters in percent, scatter, verdict. 1,500 campaigns: a Monte-Carlo error of 0.01.
	it.each([
		[1.03, 1, 0.01, 'better'],
		[1.03, 1, 0.02, 'better'],
		[0.96, 1, 0.02, 'worse'],
		[1.06, 1, 0.02, 'better'],
		[1, 1, 0.005, 'no-difference'],
		[1, 1, 0.01, 'no-difference'],
		[1.005, 2, 0.015, 'no-difference']
	] as const)(
		'a ratio of %d against %d %% with scatter %d is settled in about four of five simulated campaigns',
		(ratio, least, scatter, verdict) => {
			const n = perSideOf(runsNeededOfMedians(of(ratio, scatter), of(1, scatter), 'higher', least));
			const readings = readingsFrom(uniformFrom(20261201));
			const campaigns = 1500;
			let settled = 0;
			for (let i = 0; i < campaigns; i += 1) {
				const { comparison } = compareMedians(
					readings(n, ratio, scatter),
					readings(n, 1, scatter),
					'higher',
					least
				);
				if (comparison.verdict === verdict) settled += 1;
			}
			expect(settled / campaigns).toBeGreaterThan(0.75);
			expect(settled / campaigns).toBeLessThan(0.87);
		}
	);

	it('asks by how much the medians scatter, not the means', () => {
		const wide = runsNeededOfMedians(of(1.03, 0.02), of(1, 0.02), 'higher', 1);
		expect(wide).toMatchObject({ kind: 'runs', outcome: 'difference' });
		expect(perSideOf(wide)).toBeGreaterThan(
			perSideOf(runsNeededOfMedians(of(1.03), of(1), 'higher', 1)) * 2.5
		);
	});

	it('turns round with its sides, and does not mind the unit', () => {
		const forth = runsNeededOfMedians(of(1.03), of(1), 'higher', 1);
		expect(runsNeededOfMedians(of(1), of(1.03), 'lower', 1)).toEqual(forth);
		expect(runsNeededOfMedians(of(1.03 * 4096), of(4096), 'higher', 1)).toEqual(forth);
	});

	it('takes what is there from what is asked', () => {
		const needed = runsNeededOfMedians(of(1.02, 0.02), { ...of(1, 0.02), n: 12 }, 'higher', 1);
		if (needed.kind !== 'runs') throw new Error('no number of runs');
		expect(needed.perSide - needed.moreOfSubject).toBe(10);
		expect(needed.perSide - needed.moreOfBaseline).toBe(12);
	});

	it('asks for more where more is read together', () => {
		const alone = perSideOf(runsNeededOfMedians(of(1.03), of(1), 'higher', 1));
		expect(perSideOf(runsNeededOfMedians(of(1.03), of(1), 'higher', 1, 20))).toBeGreaterThan(alone);
	});

	it('gives up on the edge, and cannot tell from a single reading or from nothing that varies', () => {
		expect(runsNeededOfMedians(of(1.0101), of(1), 'higher', 1)).toEqual({ kind: 'too-near' });
		const single = { n: 1, median: 1, logError: null };
		expect(runsNeededOfMedians(single, of(1), 'higher', 1)).toEqual({ kind: 'unknown' });
		const still = { n: 5, median: 1, logError: 0 };
		expect(runsNeededOfMedians(still, still, 'higher', 1)).toEqual({ kind: 'unknown' });
	});
});
