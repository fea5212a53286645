import { doubtOf, doubtWords } from '../../../domain/bench/plausible';
import { defaultBaseline } from '../../../domain/bench/matrix';
import type { Context } from '../../context';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as readings from '../../db/queries/reading';
import type { FoundCell } from './find-cell';

/** At most so many are told; a script that sends a thousand in another unit sees it from these. */
const most = 20;

/**
 * A warning for each value that stands a hundred times and more from those of its cell, or of the baseline's while the
 * cell is empty. They are taken all the same: only the bench knows.
 */
export async function doubtReadings(
	ctx: Context,
	plan: CampaignPlan,
	{ profile, workload }: FoundCell,
	values: readonly number[]
): Promise<string[]> {
	const at = { campaignId: plan.head.id, workloadId: workload.id };
	const own = await readings.valuesOfCell(ctx.db, { ...at, profileId: profile.id });
	const baseline = plan.profiles.find((row) => row.slug === defaultBaseline(plan.profiles));
	const others =
		own.length === 0 && baseline && baseline.id !== profile.id
			? await readings.valuesOfCell(ctx.db, { ...at, profileId: baseline.id })
			: own;
	return values
		.flatMap((value, index) => {
			const doubt = doubtOf(value, others, workload.unit);
			return doubt ? [`Reading ${index + 1}: ${doubtWords(value, doubt)}`] : [];
		})
		.slice(0, most);
}
