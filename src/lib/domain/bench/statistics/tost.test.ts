import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { twoSidedP, upperTailP } from './interval';
import { fieller, ratioDf } from './fieller';
import { relative } from './nearly.fixture';
import { side, spread } from './sides';
import { ratioPValues, ratioT, tost } from './tost';

const treated = side(
	spread([1.53, 1.75, 2.12, 2.83, 2.58, 2.37, 2.92, 2.08, 3.01, 2.67, 2.06, 2.25, 3.08, 2.01, 1.58])
);
const control = side(
	spread([
		1.33, 1.78, 1.53, 1.95, 1.83, 1.47, 1.87, 1.55, 2.58, 2.17, 1.97, 1.62, 2.25, 3.53, 2.92, 1.78, 2.22,
		2.55, 2.75
	])
);

describe('two one-sided tests', () => {
	it('of a difference (CRAN TOSTER, test-NCSS1, Welch; R 4.2.2)', () => {
		const { pDiffer, pEquivalent } = tost(1.90017487053, -2.20288298505, 19.1690023743);
		expect(pEquivalent).toBeCloseTo(0.03628, 5);
		expect(upperTailP(2.20288298505, 19.1690023743)).toBeCloseTo(0.02002, 5);
		expect(pDiffer).toBe(1);
	});

	it('of a difference from summaries (CRAN TOSTER, test-known_results; R 4.2.2)', () => {
		const { pEquivalent } = tost(3.1530150921, -2.6960563831, 181.134367161);
		expect(pEquivalent).toBeCloseTo(0.00383899428324, 11);
		expect(upperTailP(3.1530150921, 181.134367161)).toBeCloseTo(0.000945874496548, 11);
	});
});

describe('the statistic of a ratio', () => {
	it('ASAT, equal variances, ratio 1.25 (Hauschke 1999; CRAN mratios: t −1.36275539726, p 0.0912367765631)', () => {
		// The published test pools the variances; pooled, each side's is s²/n with the same s².
		const [n, m] = [15, 19];
		const pooled =
			((n - 1) * n * (treated.varianceOfMean ?? 0) + (m - 1) * m * (control.varianceOfMean ?? 0)) /
			(n + m - 2);
		const t = ratioT(
			{ ...treated, varianceOfMean: pooled / n },
			{ ...control, varianceOfMean: pooled / m },
			1.25
		);
		expect(t).toBeCloseTo(-1.36275539726, 10);
		expect(upperTailP(-t, 32)).toBeCloseTo(0.0912367765631, 10);
	});

	it('ASAT, unequal variances: degrees of freedom, and 0.05 at both ends of the inverted test (CRAN mratios)', () => {
		expect(ratioDf(treated, control, 1)).toBeCloseTo(31.443959825, 8);
		expect(ratioDf(treated, control)).toBeCloseTo(31.979359910853, 10);
		for (const end of [0.937413496816, 1.325274261387]) {
			const df = ratioDf(treated, control, end) ?? NaN;
			// To four digits: the published inversion differs in the fifth, for a reason not seen.
			expect(twoSidedP(ratioT(treated, control, end), df)).toBeCloseTo(0.05, 4);
		}
	});

	const readings = fc.array(fc.double({ min: 90, max: 110, noNaN: true }), { minLength: 2, maxLength: 12 });
	const varied = readings.filter((values) => Math.max(...values) - Math.min(...values) > 0.01);
	const margin = fc.double({ min: 0.001, max: 0.2, noNaN: true });

	it("says with p what Fieller's 95 % and 90 % intervals say", () => {
		fc.assert(
			fc.property(varied, varied, margin, (a, b, m) => {
				const [top, bottom] = [side(spread(a)), side(spread(b))];
				const [ci95, ci90] = [fieller(top, bottom, 0.95), fieller(top, bottom, 0.9)];
				const p = ratioPValues(top, bottom, m);
				if (!ci95 || !ci90 || !p) return;
				const upper = 1 + m;
				const lower = 1 / upper;
				const apart = (q: number) => Math.abs(q - 0.05) > 1e-9;
				if (apart(p.pDiffer)) expect(p.pDiffer < 0.05).toBe(ci95[0] > upper || ci95[1] < lower);
				if (apart(p.pEquivalent)) expect(p.pEquivalent < 0.05).toBe(ci90[0] > lower && ci90[1] < upper);
			})
		);
	});

	it('does not mind which side is which', () => {
		fc.assert(
			fc.property(varied, varied, margin, (a, b, m) => {
				const [top, bottom] = [side(spread(a)), side(spread(b))];
				const forth = ratioPValues(top, bottom, m);
				const back = ratioPValues(bottom, top, m);
				expect(relative(back?.pDiffer ?? NaN, forth?.pDiffer ?? NaN)).toBeLessThan(1e-8);
				expect(relative(back?.pEquivalent ?? NaN, forth?.pEquivalent ?? NaN)).toBeLessThan(1e-8);
			})
		);
	});

	it('has none with a single reading, and is certain where nothing varies', () => {
		const still = (value: number) => side(spread([value, value]));
		expect(ratioPValues(side(spread([1])), control, 0.01)).toBeNull();
		expect(ratioPValues(still(3), still(2), 0.01)).toEqual({ pDiffer: 0, pEquivalent: 1 });
		expect(ratioPValues(still(2), still(2), 0.01)).toEqual({ pDiffer: 1, pEquivalent: 0 });
	});
});
