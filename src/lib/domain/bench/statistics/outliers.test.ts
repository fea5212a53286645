import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	canFlagOutliers,
	esdSteps,
	flagOutliers,
	generalisedEsd,
	grubbsCritical,
	modifiedZScores
} from './outliers';
import { rosner } from './published.fixture';

/** e-Handbook §1.3.5.17.1, after Tietjen & Moore. */
const uranium = [199.31, 199.53, 200.19, 200.82, 201.92, 201.95, 202.18, 245.57];

describe("Grubbs' test", () => {
	// R 4.2.2, from t quantiles, two-sided at 0.05; the table of published values is these.
	it.each([
		[3, 1.15430485],
		[4, 1.48125],
		[5, 1.71503731],
		[6, 1.88714512],
		[7, 2.01996851],
		[8, 2.12664509],
		[10, 2.28995408],
		[15, 2.54830777],
		[20, 2.70824565],
		[50, 3.12824733],
		[100, 3.3840829]
	])('critical value for %d readings', (n, critical) => {
		expect(grubbsCritical(n)).toBeCloseTo(critical, 7);
	});

	it('one-sided at 0.05 for eight readings is the 2.032 that the e-Handbook prints', () => {
		expect(grubbsCritical(8, 0.1)).toBeCloseTo(2.03165200155, 10);
	});

	it('finds the uranium outlier, G 2.4687', () => {
		const [step] = esdSteps(uranium, 1);
		expect(step?.statistic).toBeCloseTo(2.46876461121, 10);
		expect(step?.critical).toBeCloseTo(2.1266450872, 9);
		expect(flagOutliers(uranium)).toEqual([7]);
	});
});

describe('the generalised ESD test', () => {
	// e-Handbook §1.3.5.17.3 prints R and λ cut off after three decimals; the longer values are computed in R 4.2.2.
	it.each([
		[3.11890604898, 3.15879394089, 6.01],
		[2.94297311364, 3.15143002332, 5.42],
		[3.17942393672, 3.14388968503, 5.34],
		[2.81018114443, 3.13616495606, 4.64],
		[2.81557956344, 3.12824733433, -0.25],
		[2.84817162793, 3.12012773831, 4.3],
		[2.27932705499, 3.11179645429, 3.68],
		[2.31036605905, 3.1032430776, 3.59],
		[2.10158065102, 3.09445644702, 0.68],
		[2.06717807803, 3.08542457124, 3.3]
	])('Rosner, R %d against λ %d', (statistic, critical, removed) => {
		const step = esdSteps(rosner, 10).find((one) => Math.abs(one.statistic - statistic) < 1e-10);
		expect(step?.critical).toBeCloseTo(critical, 9);
		expect(rosner[step?.index ?? -1]).toBe(removed);
	});

	it('finds three where a test one by one finds none', () => {
		expect(generalisedEsd(rosner, 10).map((index) => rosner[index])).toEqual([5.34, 5.42, 6.01]);
		expect(generalisedEsd(rosner, 1)).toEqual([]);
		expect(flagOutliers(rosner).map((index) => rosner[index])).toEqual([5.34, 5.42, 6.01]);
	});
});

describe('flags', () => {
	it('are silent below six readings', () => {
		expect(flagOutliers([1, 1, 1, 1, 100])).toEqual([]);
		expect(flagOutliers([1, 1, 1, 1, 1, 100])).toEqual([5]);
		expect([5, 6].map(canFlagOutliers)).toEqual([false, true]);
	});

	it('are silent where nothing varies', () => {
		expect(flagOutliers(Array.from({ length: 20 }, () => 7))).toEqual([]);
	});

	it('stay with their readings, whatever the order', () => {
		fc.assert(
			fc.property(fc.shuffledSubarray(rosner, { minLength: rosner.length }), (values) => {
				expect(
					flagOutliers(values)
						.map((index) => values[index])
						.sort()
				).toEqual([5.34, 5.42, 6.01]);
			})
		);
	});
});

describe('modified z-scores', () => {
	it('of the uranium readings', () => {
		// Iglewicz & Hoaglin's formula as the e-Handbook quotes it, computed: median 201.37, MAD 0.995.
		const scores = modifiedZScores(uranium) ?? [];
		const published = [
			-1.396452261, -1.247316583, -0.799909548, -0.372839196, 0.372839196, 0.39317588, 0.549090452,
			29.962713568
		];
		for (const [index, score] of published.entries()) expect(scores[index]).toBeCloseTo(score, 8);
	});

	it('of Rosner: exactly three beyond 3.5', () => {
		const far = (modifiedZScores(rosner) ?? []).filter((score) => Math.abs(score) > 3.5);
		expect(far.map((score) => Number(score.toFixed(9)))).toEqual([4.016059633, 4.115068807, 4.845261468]);
	});

	it('see what masks itself from the ordinary ones', () => {
		const scores = modifiedZScores([2.1, 2.6, 2.4, 2.5, 2.3, 2.1, 2.3, 2.6, 8.2, 8.3]) ?? [];
		expect(scores[8]).toBeCloseTo(25.855833333, 8);
		expect(scores[9]).toBeCloseTo(26.3055, 8);
	});

	it('are none where more than half the readings are the same', () => {
		expect(modifiedZScores([1, 1, 1, 5])).toBeNull();
		expect(modifiedZScores([])).toBeNull();
	});
});
