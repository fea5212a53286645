import type { CellFigures, Summary, Verdict } from './figures';
import type { HeldWorkload } from './held-against';
import { runsToSettle } from './runs-to-settle';
import { coverageWarning } from './statistics/coverage-warning';
import { normalityHint } from './statistics/normality';
import { canFlagOutliers } from './statistics/outliers';
import { runsNeededShort, runsNeededWords } from './statistics/runs-needed';

/** What is to be said of a cell's comparison beside its figures. Sentences for the screen; null where nothing is. */
export interface CellNotes {
	/** What would settle it, where it is not settled; `short` for the narrow cell. */
	needed: { short: string; words: string } | null;
	/** Where the correction for many comparisons took a verdict back: the one it had by itself. */
	tookBack: Verdict | null;
	coverage: string | null;
	scatter: string | null;
	/** Readings are there, but too few to look for outliers among them. */
	tooFewToFlag: boolean;
}

const warningOf = (workload: HeldWorkload, cell: CellFigures, baseline: Summary): string | null =>
	cell.comparison?.ci95 && cell.summary
		? coverageWarning(
				workload.headline === 'median' ? 'ratio-of-medians' : 'ratio',
				Math.min(cell.summary.n, baseline.n)
			)
		: null;

/**
 * The notes of one cell.
 * @param values readings of the cell that count
 * @param baseline summary of the baseline's cell; null where it is empty or the cell is the baseline's own
 * @param together how many comparisons the table holds
 */
export function cellNotes(
	cell: CellFigures,
	values: readonly number[],
	baseline: Summary | null,
	workload: HeldWorkload,
	together: number
): CellNotes {
	const held = cell.comparison ?? cell.difference ?? null;
	const needed =
		baseline && cell.summary
			? runsToSettle(cell, cell.summary, baseline, workload, Math.max(1, together))
			: null;
	const hint = normalityHint(values);
	return {
		needed: needed && { short: runsNeededShort(needed), words: runsNeededWords(needed) },
		tookBack: held?.alone && held.alone !== held.verdict ? held.alone : null,
		coverage: baseline && warningOf(workload, cell, baseline),
		scatter: hint && hint.p < 0.05 ? hint.words : null,
		tooFewToFlag: values.length > 0 && !canFlagOutliers(values.length)
	};
}
