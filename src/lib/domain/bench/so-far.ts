import type { Comparison, Summary, Verdict } from './figures';
import { compareCells, compareSummaries } from './statistics/compare';
import { summarise } from './statistics/summary';
import type { Direction, Headline } from './words';

interface CellRules {
	better: Direction;
	headline: Headline;
	leastDifferencePercent: number;
}

export interface SoFar {
	summary: Summary;
	/** Null for the baseline itself, or where a side has no mean above zero. */
	comparison: Comparison | null;
	/** What the comparison would be without the flagged readings; null where none is flagged or nothing changes. */
	withoutFlagged: Comparison | null;
	/**
	 * Further readings after which, were they like those taken, there would be a verdict; null where there is one
	 * already, where a side has a single reading, or where more than a hundred would not settle it.
	 */
	moreToSettle: number | null;
}

/** Further readings that are thought through before the estimate gives up. */
const mostFurther = 100;

const settled = (verdict: Verdict): boolean => verdict !== 'not-enough';

/** Estimate of how many more readings settle it, mean and spread staying as they are (common practice, no source). */
function moreToSettle(summary: Summary, baseline: Summary, rules: CellRules): number | null {
	if (summary.sd === null || baseline.sd === null) return null;
	const spread = { mean: summary.mean, sd: summary.sd };
	const against = { mean: baseline.mean, sd: baseline.sd, n: baseline.n };
	for (let more = 1; more <= mostFurther; more += 1) {
		const { verdict } = compareSummaries(
			{ ...spread, n: summary.n + more },
			against,
			rules.better,
			rules.leastDifferencePercent
		);
		if (settled(verdict)) return more;
	}
	return null;
}

const positive = (values: readonly number[]): boolean =>
	values.length > 0 && values.reduce((sum, value) => sum + value, 0) > 0;

function compare(
	values: readonly number[],
	baseline: readonly number[],
	rules: CellRules
): Comparison | null {
	return positive(values) && positive(baseline)
		? compareCells(values, baseline, rules.better, rules.leastDifferencePercent)
		: null;
}

/**
 * What a cell says while it is being filled: its summary, its standing against the baseline, what the flagged
 * readings change, and how many more it would take. Null for an empty cell.
 * @param values readings that count, in the workload's unit
 * @param baseline those of the baseline's cell; null for the baseline itself
 */
export function soFar(
	values: readonly number[],
	baseline: readonly number[] | null,
	rules: CellRules
): SoFar | null {
	if (values.length === 0) return null;
	const summary = summarise(values, rules.headline);
	const comparison = baseline && compare(values, baseline, rules);
	if (!baseline || !comparison)
		return { summary, comparison: null, withoutFlagged: null, moreToSettle: null };
	const rest = values.filter((_value, at) => !summary.flagged.includes(at));
	const without = summary.flagged.length > 0 ? compare(rest, baseline, rules) : null;
	return {
		summary,
		comparison,
		withoutFlagged: without?.verdict === comparison.verdict ? null : without,
		moreToSettle: settled(comparison.verdict) ? null : moreToSettle(summary, summarise(baseline), rules)
	};
}
