import cdf from '@stdlib/stats-base-dists-t-cdf';
import quantile from '@stdlib/stats-base-dists-t-quantile';

/**
 * Two-sided p-value of a Student t statistic, taken from the lower tail so that it keeps its digits far out.
 * RangeError for df ≤ 0.
 * @example twoSidedP(-1.86081346749, 17.7764735162) // 0.0793941401874
 */
export function twoSidedP(t: number, df: number): number {
	if (!(df > 0)) throw new RangeError('Degrees of freedom must be above zero.');
	return 2 * cdf(-Math.abs(t), df);
}

/**
 * Share of Student's t above a statistic; one-sided p-value of a test that looks upward. RangeError for df ≤ 0.
 * @example upperTailP(1.90017487053, 19.1690023743) // 0.03628…
 */
export function upperTailP(t: number, df: number): number {
	if (!(df > 0)) throw new RangeError('Degrees of freedom must be above zero.');
	return cdf(-t, df);
}

/** Quantiles known already, at whole degrees of freedom: the cells of a table ask for the same few again and again. */
const quantiles = new Map<string, number>();
const mostQuantiles = 2000;

function wholeQuantile(p: number, df: number): number {
	const key = `${p}/${df}`;
	const known = quantiles.get(key);
	if (known !== undefined) return known;
	if (quantiles.size >= mostQuantiles) quantiles.clear();
	const found = quantile(p, df);
	quantiles.set(key, found);
	return found;
}

/**
 * Quantile of Student's t; `df` need not be whole. RangeError outside 0 < p < 1 or for df ≤ 0.
 * @example studentQuantile(0.975, 2) // 4.302652729…
 */
export function studentQuantile(p: number, df: number): number {
	if (!(p > 0 && p < 1)) throw new RangeError('A quantile needs a probability between 0 and 1.');
	if (!(df > 0)) throw new RangeError('Degrees of freedom must be above zero.');
	return Number.isInteger(df) ? wholeQuantile(p, df) : quantile(p, df);
}

/**
 * Student t interval of a mean, in the unit of the readings. RangeError below two readings.
 * @param level such as 0.95
 * @example meanInterval(37.8, 0.964365, 3) // [35.404…, 40.195…]
 */
export function meanInterval(mean: number, sd: number, n: number, level = 0.95): [number, number] {
	if (n < 2) throw new RangeError('An interval needs two readings or more.');
	const half = (studentQuantile((1 + level) / 2, n - 1) * sd) / Math.sqrt(n);
	return [mean - half, mean + half];
}
