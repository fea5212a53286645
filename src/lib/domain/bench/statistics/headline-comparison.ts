import type { Direction, Headline } from '../words';
import { type TestedComparison, testSummaries } from './compare';
import { compareMedians } from './robust';
import { spread } from './sides';

/**
 * A cell against its baseline by the average its protocol puts in print: means with Fieller's interval, or medians
 * with Price & Bonett's. RangeError for an empty side or an average that is not above zero.
 * @param leastDifferencePercent m, in percent
 */
export const headlineComparison = (
	subject: readonly number[],
	baseline: readonly number[],
	better: Direction,
	leastDifferencePercent: number,
	headline: Headline
): TestedComparison =>
	headline === 'median'
		? compareMedians(subject, baseline, better, leastDifferencePercent)
		: testSummaries(spread(subject), spread(baseline), better, leastDifferencePercent);
