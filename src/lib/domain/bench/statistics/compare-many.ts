import type { Verdict } from '../figures';
import type { Direction } from '../words';
import { type TestedComparison, testSummaries } from './compare';
import { holm } from './holm';
import type { Spread } from './sides';
import { verdictOf } from './verdict';

/** One row of a table: a cell, its baseline, and what matters there. Null where a side is empty. */
export interface ComparisonInput {
	subject: Spread | null;
	baseline: Spread | null;
	better: Direction;
	leastDifferencePercent: number;
}

/** A row's own comparison, and what is left of it once the whole table is read as one. */
export interface CorrectedComparison extends TestedComparison {
	/** Holm's adjusted p-values over the table; null where the row allows no test. */
	adjusted: TestedComparison['p'];
	/** Verdict by the adjusted p-values; `comparison.verdict` is the row's own. */
	verdict: Verdict;
}

/**
 * Holm's correction over comparisons that are read together, each question (does it differ, is it the same) a family
 * of its own. Rows without a test keep their place and count for nothing. A verdict can only fall to *not enough*.
 */
export function correctTogether(rows: readonly (TestedComparison | null)[]): (CorrectedComparison | null)[] {
	const tested = rows.flatMap((row) => (row?.p ? [row.p] : []));
	const differ = holm(tested.map((p) => p.pDiffer));
	const equivalent = holm(tested.map((p) => p.pEquivalent));
	let next = 0;
	return rows.map((row) => {
		if (!row) return null;
		if (!row.p) return { ...row, adjusted: null, verdict: row.comparison.verdict };
		const adjusted = { pDiffer: differ[next] ?? 1, pEquivalent: equivalent[next] ?? 1 };
		next += 1;
		return { ...row, adjusted, verdict: verdictOf(adjusted, row.comparison.ratio > 1) };
	});
}

/**
 * A whole table (profiles × workloads) against its baselines: each row's ratio of means, and its verdict when all
 * rows are read together. Null for a row with an empty side or a mean that is not above zero, which has no ratio.
 */
export const compareMany = (rows: readonly ComparisonInput[]): (CorrectedComparison | null)[] =>
	correctTogether(
		rows.map(({ subject, baseline, better, leastDifferencePercent }) =>
			subject && baseline && subject.mean > 0 && baseline.mean > 0
				? testSummaries(subject, baseline, better, leastDifferencePercent)
				: null
		)
	);
