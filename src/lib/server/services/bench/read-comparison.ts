import type { CampaignComparison } from '../../../domain/bench/comparison-csv';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { readCampaign } from './read-campaign';

/** Every profile of a campaign against one of them, workload by workload and overall. */
export async function readComparison(
	ctx: Context,
	campaignRef: string,
	baseline: string | null
): Promise<Outcome<CampaignComparison>> {
	const read = await readCampaign(ctx, campaignRef, baseline);
	if (!read.ok) return read;
	const { plan, matrix, figures } = read.value;
	return done({
		campaign: plan.head.slug,
		name: plan.head.name,
		baseline: matrix.baseline,
		profiles: plan.profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: plan.workloads.map(({ slug, name, unit, better, leastDifferencePercent }) => ({
			slug,
			name,
			unit,
			better,
			leastDifferencePercent
		})),
		cells: figures.cells,
		overall: figures.overall
	});
}
