import type { Verdict } from '../figures';
import type { Direction } from '../words';
import { type TestedComparison, testSummaries } from './compare';
import { holm } from './holm';
import type { Spread } from './sides';
import type { PValues } from './tost';
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

/** What one row of a table asks: its p-values, null where it allows no test, and the side its estimate lies on. */
export interface Question {
	p: PValues | null;
	forBetter: boolean;
}

/**
 * Holm's correction over comparisons that are read together, each question (does it differ, is it the same) a family
 * of its own. Rows without a test keep their place and count for nothing. A verdict can only fall to *not enough*.
 */
export function verdictsTogether(
	rows: readonly Question[]
): { adjusted: PValues | null; verdict: Verdict }[] {
	const tested = rows.flatMap(({ p }) => (p ? [p] : []));
	const differ = holm(tested.map((p) => p.pDiffer));
	const equivalent = holm(tested.map((p) => p.pEquivalent));
	let next = 0;
	return rows.map(({ p, forBetter }) => {
		if (!p) return { adjusted: null, verdict: verdictOf(null, forBetter) };
		const adjusted = { pDiffer: differ[next] ?? 1, pEquivalent: equivalent[next] ?? 1 };
		next += 1;
		return { adjusted, verdict: verdictOf(adjusted, forBetter) };
	});
}

/** `verdictsTogether` over ratios; null rows stay null. */
export function correctTogether(rows: readonly (TestedComparison | null)[]): (CorrectedComparison | null)[] {
	const together = verdictsTogether(
		rows.map((row) => ({ p: row?.p ?? null, forBetter: (row?.comparison.ratio ?? 1) > 1 }))
	);
	return rows.map((row, at) => {
		const corrected = together[at];
		return row && corrected ? { ...row, ...corrected } : null;
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
