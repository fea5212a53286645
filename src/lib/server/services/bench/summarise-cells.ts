import { countedReadings } from '../../../domain/bench/campaign';
import type { Comparison, Difference, Overall, Summary } from '../../../domain/bench/figures';
import { overallWords } from '../../../domain/bench/overall-words';
import type { Direction } from '../../../domain/bench/words';
import { comparedTogether } from '../../../domain/bench/held-against';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { readCampaign, type MeasuredCampaign } from './read-campaign';

export interface SummarisedCell {
	profile: string;
	workload: string;
	unit: string;
	better: Direction;
	needed: number;
	n: number;
	mean: number | null;
	median: number | null;
	sd: number | null;
	cvPercent: number | null;
	ci95: [number, number] | null;
	min: number | null;
	max: number | null;
	/** Readings that stand far from the others: flagged, not removed. */
	flagged: { id: number; value: number }[];
	signedBy: string | null;
	signedAt: string | null;
	comparison: Comparison | null;
	/** In its place where a ratio says nothing. */
	difference: Difference | null;
}

export interface CampaignSummary {
	campaign: string;
	name: string;
	baseline: string;
	/** Comparisons read together: each verdict is corrected for so many (Holm). */
	together: number;
	cells: SummarisedCell[];
	/** `words`: what the figure rests on and what it leaves out, in sentences. */
	overall: ({ profile: string; words: string } & Overall)[];
}

const spread = (summary: Summary | null) => ({
	n: summary?.n ?? 0,
	mean: summary?.mean ?? null,
	median: summary?.median ?? null,
	sd: summary?.sd ?? null,
	cvPercent: summary?.cvPercent ?? null,
	ci95: summary?.ci95 ?? null,
	min: summary?.min ?? null,
	max: summary?.max ?? null
});

/** A measured campaign as the API tells it. */
export function summaryOf({ plan, matrix, figures }: MeasuredCampaign): CampaignSummary {
	const workloads = new Map(plan.workloads.map((row) => [row.slug, row]));
	const cells = figures.cells.flatMap((cell): SummarisedCell[] => {
		const workload = workloads.get(cell.workload);
		if (!workload) return [];
		const { profile, needed, summary, signedBy, signedAt, comparison } = cell;
		const counted = summary?.flagged.length
			? countedReadings(
					matrix.runs.filter((run) => run.profile === profile && run.workload === workload.slug)
				)
			: [];
		return [
			{
				profile,
				workload: workload.slug,
				unit: workload.unit,
				better: workload.better,
				needed,
				...spread(summary),
				flagged: (summary?.flagged ?? []).flatMap((at) => {
					const reading = counted[at];
					return reading ? [{ id: reading.id, value: reading.value }] : [];
				}),
				signedBy,
				signedAt,
				comparison,
				difference: cell.difference ?? null
			}
		];
	});
	return {
		campaign: plan.head.slug,
		name: plan.head.name,
		baseline: matrix.baseline,
		together: comparedTogether(figures.cells),
		cells,
		overall: plan.profiles.flatMap(({ slug, name }) => {
			const figure = figures.overall[slug];
			return figure
				? [{ profile: slug, ...figure, words: overallWords([{ name, figure }], plan.workloads).join(' ') }]
				: [];
		})
	};
}

/** Every figure of a campaign: cell by cell, against a baseline, and each profile's geometric mean. */
export async function summariseCells(
	ctx: Context,
	campaignRef: string,
	baseline: string | null
): Promise<Outcome<CampaignSummary>> {
	const read = await readCampaign(ctx, campaignRef, baseline);
	return read.ok ? done(summaryOf(read.value)) : read;
}
