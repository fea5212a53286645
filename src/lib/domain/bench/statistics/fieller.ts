import { studentQuantile } from './interval';
import { type Side, satterthwaite } from './sides';

/**
 * Degrees of freedom of a ratio of means, after Satterthwaite, at a ratio (by default the estimated one).
 * Null with a single reading on a side or where neither side varies.
 */
export function ratioDf(top: Side, bottom: Side, ratio = top.mean / bottom.mean): number | null {
	const { varianceOfMean: a } = top;
	const { varianceOfMean: b } = bottom;
	if (a === null || b === null || (a === 0 && b === 0)) return null;
	return satterthwaite(a, top.df, ratio ** 2 * b, bottom.df);
}

/**
 * Fieller's interval for a ratio of means with unequal variances, degrees of freedom after Satterthwaite
 * at the estimated ratio. Null with a single reading on a side, or where a mean cannot be told from zero:
 * the set is then unbounded, in this ratio or in its inverse. Swapping the sides gives the inverse limits.
 * Source: Fieller 1954; plug-in degrees of freedom as in CRAN mratios.
 * @param level such as 0.95
 */
export function fieller(top: Side, bottom: Side, level: number): [number, number] | null {
	const { varianceOfMean: a } = top;
	const { varianceOfMean: b } = bottom;
	if (a === null || b === null) return null;
	const ratio = top.mean / bottom.mean;
	const df = ratioDf(top, bottom);
	if (df === null) return [ratio, ratio];
	const t = studentQuantile((1 + level) / 2, df);
	const g = (t ** 2 * b) / bottom.mean ** 2;
	const gInverse = (t ** 2 * a) / top.mean ** 2;
	if (g >= 1 || gInverse >= 1) return null;
	const half = ratio * Math.sqrt(g + gInverse - g * gInverse);
	return [(ratio - half) / (1 - g), (ratio + half) / (1 - g)];
}
