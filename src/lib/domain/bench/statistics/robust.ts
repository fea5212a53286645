import { median } from 'simple-statistics';
import type { Direction } from '../words';
import { fairCoinAtMost } from './binomial';
import { asComparison, type TestedComparison } from './compare';
import { normalQuantile, normalUpperTail } from './normal';

const ascending = (values: readonly number[]): number[] => {
	if (values.length === 0) throw new RangeError('A median needs at least one reading.');
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	// Past a thousand halves of a coin vanish in binary; nobody runs a benchmark so often.
	if (values.length > 1000)
		throw new RangeError('A median with its interval takes a thousand readings at most.');
	return [...values].sort((a, b) => a - b);
};

export interface MedianInterval {
	median: number;
	/** Two of the readings; null where too few to reach the level (below six at 95 %). */
	ci: [number, number] | null;
	/** The level it really has, at least the one asked for. */
	coverage: number | null;
}

/**
 * Median with an interval between two of the readings, exact for any continuous distribution: the pair closest to the
 * middle that a fair coin leaves the level to. RangeError for no reading or one that is not finite.
 * Source: Conover, Practical Nonparametric Statistics, §3.2.
 * @example medianInterval([1, 2, 3, 4, 5, 6]).ci // [1, 6], coverage 0.96875
 */
export function medianInterval(values: readonly number[], level = 0.95): MedianInterval {
	const sorted = ascending(values);
	const n = sorted.length;
	let rank = 0;
	while (rank < n / 2 && fairCoinAtMost(rank, n) <= (1 - level) / 2) rank += 1;
	const [low, high] = [sorted[rank - 1], sorted[n - rank]];
	const middle = median(sorted);
	if (low === undefined || high === undefined) return { median: middle, ci: null, coverage: null };
	return { median: middle, ci: [low, high], coverage: 1 - 2 * fairCoinAtMost(rank - 1, n) };
}

/**
 * Hodges–Lehmann estimate of how far the first set lies above the second: the median of all pairwise differences, in
 * the unit of the readings. RangeError for an empty set. Source: Hollander & Wolfe; as R's `wilcox.test`.
 */
export const hodgesLehmann = (first: readonly number[], second: readonly number[]): number =>
	median(ascending(first).flatMap((a) => ascending(second).map((b) => a - b)));

/** Rank of the lower of the two order statistics that a median's error is taken from. Halves go down, as R's round does at these sizes. */
const errorRank = (n: number): number => Math.max(1, Math.ceil((n + 1) / 2 - Math.sqrt(n) - 0.5));

/** Deviations between the two, as a fair coin has it. */
const errorWidth = (rank: number, n: number): number => 2 * normalQuantile(1 - fairCoinAtMost(rank - 1, n));

/**
 * What `logMedianError` comes to on the average for so many normal readings of small relative deviation, in such
 * deviations: near 1.2533/√n, larger by up to a fifth below ten readings. Expected order statistics by Blom's
 * Φ⁻¹((i − 3/8)/(n + 1/4)) (1958). RangeError below two.
 */
export function expectedMedianError(n: number): number {
	if (n < 2) throw new RangeError('A median has an error from two readings on.');
	const rank = errorRank(n);
	return (2 * normalQuantile((n - rank + 1 - 0.375) / (n + 0.25))) / errorWidth(rank, n);
}

/**
 * Standard error of the logarithm of a median (Price & Bonett 2001, after McKean & Schrader): the distance of two
 * order statistics in the deviations that a fair coin gives them. Null for a single reading, or where one of the two is
 * not above zero.
 */
export function logMedianError(values: readonly number[]): number | null {
	const sorted = ascending(values);
	const n = sorted.length;
	if (n < 2) return null;
	const rank = errorRank(n);
	const [low, high] = [sorted[rank - 1] ?? NaN, sorted[n - rank] ?? NaN];
	if (!(low > 0)) return null;
	return Math.log(high / low) / errorWidth(rank, n);
}

/** What a comparison of medians needs of a set of readings: `logError` as `logMedianError` gives it. */
export interface MedianSpread {
	median: number;
	logError: number | null;
}

/**
 * Ratio of medians, turned so that above 1 is better, with Price & Bonett's interval on the logarithms (2002) and a
 * verdict by the same rules as a ratio of means. No interval with a single reading on a side.
 * RangeError for a median that is not above zero.
 * @param leastDifferencePercent m, in percent
 */
export function testMedians(
	subject: MedianSpread,
	baseline: MedianSpread,
	better: Direction,
	leastDifferencePercent: number
): TestedComparison {
	const turned = better === 'higher' ? ([subject, baseline] as const) : ([baseline, subject] as const);
	const [{ median: a, logError: errorA }, { median: b, logError: errorB }] = turned;
	if (!(a > 0 && b > 0)) throw new RangeError('A ratio needs medians above zero.');
	const ratio = a / b;
	if (errorA === null || errorB === null) return asComparison(ratio, null, null);
	const se = Math.hypot(errorA, errorB);
	const factor = Math.exp(normalQuantile(0.975) * se);
	const margin = Math.log1p(leastDifferencePercent / 100);
	// A statistic of 0 / 0, on the very edge without scatter, settles nothing.
	const z = (distance: number) => (distance === 0 ? 0 : distance / se);
	const [zLower, zUpper] = [z(Math.log(ratio) + margin), z(Math.log(ratio) - margin)];
	return asComparison(ratio, [ratio / factor, ratio * factor], {
		pDiffer: Math.min(1, 2 * normalUpperTail(Math.max(zUpper, -zLower))),
		pEquivalent: normalUpperTail(Math.min(zLower, -zUpper))
	});
}

/** The same from the readings. RangeError also for an empty side. */
export function compareMedians(
	subject: readonly number[],
	baseline: readonly number[],
	better: Direction,
	leastDifferencePercent: number
): TestedComparison {
	const spreadOf = (values: readonly number[]): MedianSpread => ({
		median: median(ascending(values)),
		logError: logMedianError(values)
	});
	return testMedians(spreadOf(subject), spreadOf(baseline), better, leastDifferencePercent);
}
