import { studentQuantile, twoSidedP } from './interval';
import { satterthwaite, type Side, side, spread } from './sides';

export interface WelchTest {
	/** Mean of the first minus mean of the second, in the unit of the readings. */
	difference: number;
	/** Standard error of the difference. */
	se: number;
	t: number;
	df: number;
	/** Two-sided. */
	p: number;
	ci: [number, number];
}

/** Welch's test from two sides. RangeError with a single reading on one or where neither varies. */
export function welchSides(a: Side, b: Side, level = 0.95): WelchTest {
	if (a.varianceOfMean === null || b.varianceOfMean === null) {
		throw new RangeError("Welch's test needs two readings or more on each side.");
	}
	const variance = a.varianceOfMean + b.varianceOfMean;
	if (!(variance > 0)) throw new RangeError("Welch's test needs readings that vary.");
	const difference = a.mean - b.mean;
	const df = satterthwaite(a.varianceOfMean, a.df, b.varianceOfMean, b.df);
	const se = Math.sqrt(variance);
	const t = difference / se;
	const half = studentQuantile((1 + level) / 2, df) * se;
	return { difference, se, t, df, p: twoSidedP(t, df), ci: [difference - half, difference + half] };
}

/**
 * Welch's test of two means with unequal variances, with the interval of their difference.
 * RangeError with fewer than two readings on a side or where neither side varies.
 */
export const welch = (first: readonly number[], second: readonly number[], level = 0.95): WelchTest =>
	welchSides(side(spread(first)), side(spread(second)), level);
