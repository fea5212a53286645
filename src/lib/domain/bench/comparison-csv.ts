import Papa from 'papaparse';
import type { CellUncertainty } from './cell-uncertainty';
import type { CellNotes } from './comparison-notes';
import { overallWords } from './overall-words';
import { verdictWords, type CellFigures, type Overall, type Verdict, type WorkloadFacts } from './figures';

interface ComparedNotes extends CellNotes {
	/** That the rig was off meanwhile, in words. */
	off: string | null;
	/** Null where no instrument is named. */
	uncertainty: CellUncertainty | null;
}

/** A campaign's profiles held against one of them. */
export interface CampaignComparison {
	/** Slugs of the campaign and the baseline. */
	campaign: string;
	name: string;
	baseline: string;
	profiles: { slug: string; name: string }[];
	workloads: WorkloadFacts[];
	cells: (CellFigures & { notes: ComparedNotes })[];
	/** Comparisons that were tested, and so corrected for each other. */
	together: number;
	overall: Record<string, Overall>;
}

const words = (verdict: Verdict | undefined): string => (verdict ? verdictWords[verdict] : '');

/**
 * A comparison as CSV, one line for each cell and one for each profile's geometric mean; nothing is rounded.
 * Texts that a spreadsheet would take for a formula are kept from being one.
 */
export function comparisonCsv(comparison: CampaignComparison): string {
	const units = new Map(comparison.workloads.map((workload) => [workload.slug, workload.unit]));
	const cells = comparison.cells.map(
		({ profile, workload, summary, comparison: held, difference, notes, signedBy }) => ({
			profile,
			workload,
			unit: units.get(workload) ?? '',
			n: summary?.n ?? 0,
			mean: summary?.mean ?? '',
			median: summary?.median ?? '',
			sd: summary?.sd ?? '',
			cv_percent: summary?.cvPercent ?? '',
			mean_low_95: summary?.ci95?.[0] ?? '',
			mean_high_95: summary?.ci95?.[1] ?? '',
			baseline: comparison.baseline,
			ratio: held?.ratio ?? '',
			ratio_low_95: held?.ci95?.[0] ?? '',
			ratio_high_95: held?.ci95?.[1] ?? '',
			gain_percent: held?.gainPercent ?? '',
			difference: difference?.difference ?? '',
			difference_low_95: difference?.ci95?.[0] ?? '',
			difference_high_95: difference?.ci95?.[1] ?? '',
			verdict: words((held ?? difference)?.verdict),
			verdict_alone: words((held ?? difference)?.alone),
			standard_uncertainty: notes.uncertainty?.u ?? '',
			coverage_factor: notes.uncertainty?.k ?? '',
			expanded_uncertainty: notes.uncertainty?.expanded ?? '',
			rig_off: notes.off ?? '',
			signed_by: signedBy ?? '',
			rests_on: ''
		})
	);
	const overall = comparison.profiles.flatMap(({ slug, name }) => {
		const figure = comparison.overall[slug];
		return figure
			? [
					{
						profile: slug,
						workload: 'geometric mean',
						n: figure.workloads.length,
						baseline: comparison.baseline,
						ratio: figure.ratio,
						ratio_low_95: figure.ci95?.[0] ?? '',
						ratio_high_95: figure.ci95?.[1] ?? '',
						gain_percent: figure.gainPercent,
						rests_on: overallWords([{ name, figure }], comparison.workloads).join(' ')
					}
				]
			: [];
	});
	const columns = Object.keys(cells[0] ?? {});
	return `${Papa.unparse([...cells, ...overall], { columns, newline: '\r\n', escapeFormulae: /^[=+@\t\r]/ })}\r\n`;
}
