import type { Comparison, Difference, Summary } from './figures';
import { heldAgainst, type HeldWorkload, type Standing } from './held-against';
import { runsToSettle } from './runs-to-settle';
import { runsNeededWords } from './statistics/runs-needed';
import { summarise } from './statistics/summary';

type CellRules = Omit<HeldWorkload, 'slug'>;

export interface SoFar {
	summary: Summary;
	/** By itself, not corrected for the other cells. Null for the baseline itself, or where there is no ratio. */
	comparison: Comparison | null;
	/** In its place where a ratio says nothing. */
	difference: Difference | null;
	/** What the comparison would be without the flagged readings; null where none is flagged or nothing changes. */
	withoutFlagged: Comparison | null;
	/** How many more readings would settle it, in words; null where there is a verdict already. */
	moreToSettle: string | null;
}

const nothing: Standing = { comparison: null, difference: null };

/** A cell held against the baseline's as the comparison holds it, but alone. */
function held(summary: Summary, baseline: Summary, rules: CellRules): Standing {
	const cells = [
		{ profile: 'baseline', workload: 'this', summary: baseline },
		{ profile: 'subject', workload: 'this', summary }
	];
	return heldAgainst(cells, [{ ...rules, slug: 'this' }], 'baseline')[1] ?? nothing;
}

function moreToSettle(
	summary: Summary,
	baseline: Summary,
	standing: Standing,
	rules: CellRules
): string | null {
	const needed = runsToSettle(standing, summary, baseline, rules);
	return needed && runsNeededWords(needed);
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
	const against = baseline && baseline.length > 0 ? summarise(baseline, rules.headline) : null;
	const standing = against ? held(summary, against, rules) : nothing;
	const { comparison } = standing;
	const rest = values.filter((_value, at) => !summary.flagged.includes(at));
	const without =
		against && comparison && summary.flagged.length > 0 && rest.length > 0
			? held(summarise(rest, rules.headline), against, rules).comparison
			: null;
	return {
		summary,
		...standing,
		withoutFlagged: without?.verdict === comparison?.verdict ? null : without,
		moreToSettle: against && moreToSettle(summary, against, standing, rules)
	};
}
