import { upperTailP } from './interval';
import { ratioDf } from './fieller';
import type { Side } from './sides';

/** Two questions asked of one comparison, each with its p-value. */
export interface PValues {
	/** Null hypothesis: the difference is not beyond what matters. Two-sided, so that 0.05 is the 95 % interval. */
	pDiffer: number;
	/** Null hypothesis: the difference is not inside what matters. The larger of two one-sided tests (Schuirmann 1987). */
	pEquivalent: number;
}

/**
 * Both p-values from the statistics that hold an estimate against the lower and the upper margin, each positive
 * where the estimate lies above its margin.
 */
export function tost(tLower: number, tUpper: number, df: number): PValues {
	return {
		pDiffer: Math.min(1, 2 * upperTailP(Math.max(tUpper, -tLower), df)),
		pEquivalent: upperTailP(Math.min(tLower, -tUpper), df)
	};
}

/**
 * Statistic that holds a ratio of means against `theta`: T = (a − θ b) / √(va + θ² vb), the one that Fieller's
 * interval inverts (Sasabuchi's; Hauck & Anderson 1992; Tamhane & Logan 2004). NaN with a single reading on a side.
 */
export const ratioT = (top: Side, bottom: Side, theta: number): number =>
	(top.mean - theta * bottom.mean) /
	Math.sqrt((top.varianceOfMean ?? NaN) + theta ** 2 * (bottom.varianceOfMean ?? NaN));

/**
 * p-values of a ratio of means against the band 1/(1 + m) to 1 + m. Degrees of freedom at the estimated ratio, as in
 * the printed interval, so that p below 0.05 and an interval beyond the margin are one statement.
 * Null with a single reading on a side.
 * @param m such as 0.01 for 1 %
 */
export function ratioPValues(top: Side, bottom: Side, m: number): PValues | null {
	if (top.varianceOfMean === null || bottom.varianceOfMean === null) return null;
	const [lower, upper] = [1 / (1 + m), 1 + m];
	const df = ratioDf(top, bottom);
	if (df !== null) return tost(ratioT(top, bottom, lower), ratioT(top, bottom, upper), df);
	// Nothing varies: the ratio is known, and lies beyond, inside, or on the edge.
	const ratio = top.mean / bottom.mean;
	return {
		pDiffer: ratio > upper || ratio < lower ? 0 : 1,
		pEquivalent: ratio > lower && ratio < upper ? 0 : 1
	};
}
