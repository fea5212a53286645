import { mean, sampleVariance } from 'simple-statistics';
import type { Comparison, Summary, Verdict } from '../figures';
import type { Direction } from '../words';
import { studentQuantile, twoSidedP } from './interval';

/** Mean, variance of the mean and degrees of freedom of one side. */
interface Side {
	mean: number;
	/** s² / n; null for a single reading. */
	varianceOfMean: number | null;
	df: number;
}

type Spread = Pick<Summary, 'n' | 'mean' | 'sd'>;

const side = ({ n, mean: centre, sd }: Spread): Side => ({
	mean: centre,
	varianceOfMean: sd === null ? null : sd ** 2 / n,
	df: n - 1
});

function spread(values: readonly number[]): Spread {
	if (values.length === 0) throw new RangeError('A comparison needs readings on both sides.');
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const list = [...values];
	return {
		n: list.length,
		mean: mean(list),
		sd: list.length > 1 ? Math.sqrt(sampleVariance(list)) : null
	};
}

/**
 * Degrees of freedom of a sum of two variances of means, not both zero (Welch–Satterthwaite), in shares of the
 * larger, so that very small or large units neither vanish nor overflow when squared.
 */
function satterthwaite(a: number, dfA: number, b: number, dfB: number): number {
	const larger = Math.max(a, b);
	const [shareA, shareB] = [a / larger, b / larger];
	return (shareA + shareB) ** 2 / (shareA ** 2 / dfA + shareB ** 2 / dfB);
}

/**
 * Fieller's interval for a ratio of means with unequal variances, degrees of freedom after Satterthwaite
 * at the estimated ratio. Null with a single reading on a side, or where a mean cannot be told from zero:
 * the set is then unbounded, in this ratio or in its inverse. Swapping the sides gives the inverse limits.
 * Source: Fieller 1954; plug-in degrees of freedom as in CRAN mratios.
 */
function fieller(top: Side, bottom: Side, level: number): [number, number] | null {
	const { varianceOfMean: a } = top;
	const { varianceOfMean: b } = bottom;
	if (a === null || b === null) return null;
	const ratio = top.mean / bottom.mean;
	if (a === 0 && b === 0) return [ratio, ratio];
	const t = studentQuantile((1 + level) / 2, satterthwaite(a, top.df, ratio ** 2 * b, bottom.df));
	const g = (t ** 2 * b) / bottom.mean ** 2;
	const gInverse = (t ** 2 * a) / top.mean ** 2;
	if (g >= 1 || gInverse >= 1) return null;
	const half = ratio * Math.sqrt(g + gInverse - g * gInverse);
	return [(ratio - half) / (1 - g), (ratio + half) / (1 - g)];
}

/** Verdict of a 95 % and a 90 % interval of a ratio against the least difference that matters. */
function judge(
	ci95: [number, number] | null,
	ci90: [number, number] | null,
	leastDifference: number
): Verdict {
	if (!ci95 || !ci90) return 'not-enough';
	const upper = 1 + leastDifference;
	const lower = 1 / upper;
	if (ci95[0] > upper) return 'better';
	if (ci95[1] < lower) return 'worse';
	// Two one-sided tests at 0.05 are the 90 % interval wholly inside the margins (Schuirmann 1987).
	if (ci90[0] > lower && ci90[1] < upper) return 'no-difference';
	return 'not-enough';
}

/**
 * A cell against its baseline from their summaries: the ratio of means, turned so that above 1 is better, with
 * Fieller's 95 % interval and a verdict. *Better* or *worse*: the 95 % interval lies wholly beyond the band of
 * what does not matter, 1/(1 + m) to 1 + m. *No difference*: the 90 % interval lies wholly inside it.
 * RangeError for a mean that is not above zero, where a ratio says nothing.
 * @param leastDifferencePercent m, in percent
 */
export function compareSummaries(
	subject: Spread,
	baseline: Spread,
	better: Direction,
	leastDifferencePercent: number
): Comparison {
	if (!(subject.mean > 0 && baseline.mean > 0)) throw new RangeError('A ratio needs means above zero.');
	const turned = better === 'higher' ? ([subject, baseline] as const) : ([baseline, subject] as const);
	const [top, bottom] = [side(turned[0]), side(turned[1])];
	const ratio = top.mean / bottom.mean;
	const ci95 = fieller(top, bottom, 0.95);
	return {
		ratio,
		ci95,
		gainPercent: (ratio - 1) * 100,
		gainCi95: ci95 && [(ci95[0] - 1) * 100, (ci95[1] - 1) * 100],
		verdict: judge(ci95, fieller(top, bottom, 0.9), leastDifferencePercent / 100)
	};
}

/**
 * The same from the readings themselves. RangeError also for an empty side.
 * @example compareCells([104, 105], [98, 99], 'higher', 1).ratio // 1.0609…
 */
export const compareCells = (
	subject: readonly number[],
	baseline: readonly number[],
	better: Direction,
	leastDifferencePercent: number
): Comparison => compareSummaries(spread(subject), spread(baseline), better, leastDifferencePercent);

export interface WelchTest {
	/** Mean of the first minus mean of the second, in the unit of the readings. */
	difference: number;
	t: number;
	df: number;
	/** Two-sided. */
	p: number;
	ci: [number, number];
}

/**
 * Welch's test of two means with unequal variances, with the interval of their difference.
 * RangeError with fewer than two readings on a side or where neither side varies.
 */
export function welch(first: readonly number[], second: readonly number[], level = 0.95): WelchTest {
	const a = side(spread(first));
	const b = side(spread(second));
	if (a.varianceOfMean === null || b.varianceOfMean === null) {
		throw new RangeError("Welch's test needs two readings or more on each side.");
	}
	const variance = a.varianceOfMean + b.varianceOfMean;
	if (!(variance > 0)) throw new RangeError("Welch's test needs readings that vary.");
	const difference = a.mean - b.mean;
	const df = satterthwaite(a.varianceOfMean, a.df, b.varianceOfMean, b.df);
	const t = difference / Math.sqrt(variance);
	const half = studentQuantile((1 + level) / 2, df) * Math.sqrt(variance);
	return { difference, t, df, p: twoSidedP(t, df), ci: [difference - half, difference + half] };
}
