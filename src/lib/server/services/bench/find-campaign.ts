import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as facts from '../../db/queries/campaign-facts';

/** A campaign's plan by slug or id, for the other services of the bench, which have asked whether the actor may. */
export async function findCampaign(
	ctx: Context,
	ref: string
): Promise<Outcome<facts.CampaignPlan, 'not_found'>> {
	const id = await campaigns.idOf(ctx.db, ref);
	const [plan] = id === undefined ? [] : await facts.plansOf(ctx.db, [id]);
	return plan ? done(plan) : refuse('not_found', 'There is no such campaign.');
}

/** As findCampaign, and refused while the campaign is archived. */
export async function findOpenCampaign(
	ctx: Context,
	ref: string
): Promise<Outcome<facts.CampaignPlan, 'not_found' | 'conflict'>> {
	const found = await findCampaign(ctx, ref);
	if (found.ok && found.value.head.archivedAt)
		return refuse(
			'conflict',
			'This campaign is archived. Nothing was changed; take it out of the archive first.'
		);
	return found;
}
