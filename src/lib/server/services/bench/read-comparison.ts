import { countedReadings } from '../../../domain/bench/campaign';
import type { CampaignComparison } from '../../../domain/bench/comparison-csv';
import { cellNotes } from '../../../domain/bench/comparison-notes';
import { comparedTogether } from '../../../domain/bench/held-against';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { readCampaign, type MeasuredCampaign } from './read-campaign';

function comparisonOf({ plan, matrix, figures }: MeasuredCampaign): CampaignComparison {
	const { baseline } = matrix;
	const together = comparedTogether(figures.cells);
	const cells = figures.cells.flatMap((cell) => {
		const workload = plan.workloads.find((row) => row.slug === cell.workload);
		if (!workload) return [];
		const against = figures.cells.find(
			(one) => one.profile === baseline && one.workload === cell.workload
		)?.summary;
		const values = countedReadings(
			matrix.runs.filter((run) => run.profile === cell.profile && run.workload === cell.workload)
		).map((reading) => reading.value);
		const held = cell.profile === baseline ? null : (against ?? null);
		return [{ ...cell, notes: cellNotes(cell, values, held, workload, together) }];
	});
	return {
		campaign: plan.head.slug,
		name: plan.head.name,
		baseline,
		profiles: plan.profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: plan.workloads,
		cells,
		together,
		overall: figures.overall
	};
}

/** Every profile of a campaign against one of them, workload by workload and overall. */
export async function readComparison(
	ctx: Context,
	campaignRef: string,
	baseline: string | null
): Promise<Outcome<CampaignComparison>> {
	const read = await readCampaign(ctx, campaignRef, baseline);
	return read.ok ? done(comparisonOf(read.value)) : read;
}
