import { summariseCampaign, type CampaignFigures } from '../../../domain/bench/campaign';
import { defaultBaseline, matrixOf, type StoredMatrix } from '../../../domain/bench/matrix';
import { may } from '../../../domain/people/policy';
import { nearest } from '../../../domain/shared/nearest';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as recorded from '../../db/queries/campaign-readings';
import { findCampaign } from './find-campaign';

export interface MeasuredCampaign {
	plan: CampaignPlan;
	recorded: recorded.CampaignReadings;
	matrix: StoredMatrix;
	figures: CampaignFigures;
}

function chooseBaseline(plan: CampaignPlan, ref: string | null): Outcome<string, 'invalid'> {
	const fallback = defaultBaseline(plan.profiles);
	if (ref === null || ref === '') {
		return fallback === null ? refuse('invalid', 'This campaign has no profiles.') : done(fallback);
	}
	const chosen = plan.profiles.find((row) => row.slug === ref || String(row.id) === ref);
	if (chosen) return done(chosen.slug);
	const slugs = plan.profiles.map((row) => row.slug);
	const near = nearest(ref, slugs);
	const words = `This campaign has no profile “${ref.slice(0, 80)}” to hold the others against. It has ${(near.length > 0 ? near : slugs).join(', ')}.`;
	return refuse('invalid', words, { fields: { baseline: [words] } });
}

/**
 * A campaign with all its readings and every figure of them, against a baseline (stock when none is named).
 * The number of queries does not depend on how much was measured.
 */
export async function readCampaign(
	ctx: Context,
	campaignRef: string,
	baselineRef: string | null = null
): Promise<Outcome<MeasuredCampaign>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const plan = found.value;
	const baseline = chooseBaseline(plan, baselineRef);
	if (!baseline.ok) return baseline;
	const all = await recorded.forCampaigns(ctx.db, [plan.head.id]);
	const own = all.get(plan.head.id) ?? { runs: [], signatures: [] };
	const matrix = matrixOf(plan, own, baseline.value);
	return done({ plan, recorded: own, matrix, figures: summariseCampaign(matrix) });
}
