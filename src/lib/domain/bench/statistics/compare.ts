import type { Comparison } from '../figures';
import type { Direction } from '../words';
import { fieller } from './fieller';
import { side, type Spread, spread } from './sides';
import { type PValues, ratioPValues } from './tost';
import { verdictOf } from './verdict';

/** A comparison with the p-values its verdict rests on; null where the readings allow no test. */
export interface TestedComparison {
	comparison: Comparison;
	p: PValues | null;
}

/** A ratio, its interval and its p-values as a comparison; without an interval there is no verdict either. */
export const asComparison = (
	ratio: number,
	ci95: [number, number] | null,
	p: PValues | null
): TestedComparison => {
	const tested = ci95 && p;
	return {
		comparison: {
			ratio,
			ci95,
			gainPercent: (ratio - 1) * 100,
			gainCi95: ci95 && [(ci95[0] - 1) * 100, (ci95[1] - 1) * 100],
			verdict: verdictOf(tested, ratio > 1)
		},
		p: tested
	};
};

/** As `compareSummaries`, with the p-values: for a table whose verdicts are corrected together. */
export function testSummaries(
	subject: Spread,
	baseline: Spread,
	better: Direction,
	leastDifferencePercent: number
): TestedComparison {
	if (!(subject.mean > 0 && baseline.mean > 0)) throw new RangeError('A ratio needs means above zero.');
	const turned = better === 'higher' ? ([subject, baseline] as const) : ([baseline, subject] as const);
	const [top, bottom] = [side(turned[0]), side(turned[1])];
	return asComparison(
		top.mean / bottom.mean,
		fieller(top, bottom, 0.95),
		ratioPValues(top, bottom, leastDifferencePercent / 100)
	);
}

/**
 * A cell against its baseline from their summaries: the ratio of means, turned so that above 1 is better, with
 * Fieller's 95 % interval and a verdict. *Better* or *worse*: the 95 % interval lies wholly beyond the band of
 * what does not matter, 1/(1 + m) to 1 + m. *No difference*: the 90 % interval lies wholly inside it, which is two
 * one-sided tests at 0.05 (Schuirmann 1987). RangeError for a mean that is not above zero, where a ratio says nothing.
 * @param leastDifferencePercent m, in percent
 */
export const compareSummaries = (
	subject: Spread,
	baseline: Spread,
	better: Direction,
	leastDifferencePercent: number
): Comparison => testSummaries(subject, baseline, better, leastDifferencePercent).comparison;

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
