import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as live from '../../db/queries/live';

/** Where a watch of a campaign begins: after the entry its page had last, or after the newest. */
export async function watchCampaign(
	ctx: Context,
	campaignRef: string,
	after: number | null
): Promise<Outcome<{ campaign: number; after: number }>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const campaign = await campaigns.idOf(ctx.db, campaignRef);
	if (campaign === undefined) return refuse('not_found', 'There is no such campaign.');
	const newest = await live.newestOf(ctx.db, campaign);
	// A page from long ago reads the board anew; what it missed need not be told one by one.
	const from = after === null ? newest : Math.min(after, newest);
	return done({ campaign, after: from });
}
