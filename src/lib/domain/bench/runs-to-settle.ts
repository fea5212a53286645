import type { CellFigures, Summary } from './figures';
import type { HeldWorkload } from './held-against';
import { type RunsNeeded, runsNeeded, runsNeededOfDifference } from './statistics/runs-needed';
import { type CountedMedian, runsNeededOfMedians } from './statistics/runs-needed-of-medians';

type Rules = Omit<HeldWorkload, 'slug'>;

/** A set as its median enters the comparison; null where the workload prints the mean, or no error was taken. */
const medianOf = ({ n, median, medianLogError }: Summary, { headline }: Rules): CountedMedian | null =>
	headline === 'median' && medianLogError !== undefined && median > 0
		? { n, median, logError: medianLogError }
		: null;

/**
 * How many more readings would settle a cell that says *not enough runs*, by the average its comparison is of. Null
 * where there is a verdict, or nothing to compare.
 * @param together comparisons read together
 */
export function runsToSettle(
	{ comparison, difference }: Pick<CellFigures, 'comparison' | 'difference'>,
	summary: Summary,
	baseline: Summary,
	rules: Rules,
	together = 1
): RunsNeeded | null {
	if (difference?.verdict === 'not-enough')
		return runsNeededOfDifference(summary, baseline, difference.least, together);
	if (comparison?.verdict !== 'not-enough') return null;
	const { better, leastDifferencePercent } = rules;
	const [ours, theirs] = [medianOf(summary, rules), medianOf(baseline, rules)];
	return ours && theirs
		? runsNeededOfMedians(ours, theirs, better, leastDifferencePercent, together)
		: runsNeeded(summary, baseline, better, leastDifferencePercent, together);
}
