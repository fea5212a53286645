import { campaignState } from '../../../domain/bench/campaign-state';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CampaignsApiQuery } from '../../../schemas/campaign';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as progress from '../../db/queries/campaign-progress';
import type { DescribedCampaign } from './describe-campaign';

export type CampaignItem = Pick<
	DescribedCampaign,
	'id' | 'slug' | 'name' | 'dueAt' | 'createdAt' | 'state' | 'progress'
> & { rig: { slug: string; name: string; revision: number } };

/** Campaigns in the order they were made, one more than asked for where there are more. */
export async function listForApi(ctx: Context, query: CampaignsApiQuery): Promise<Outcome<CampaignItem[]>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const rows = await campaigns.list(ctx.db, {
		text: query.q,
		rig: query.rig,
		state: query.state,
		sort: 'id',
		way: 'up',
		after: query.after,
		limit: query.limit + 1,
		offset: 0
	});
	const counted = await progress.ofCampaigns(
		ctx.db,
		rows.map((row) => row.id)
	);
	return done(
		rows.flatMap((row) => {
			const far = counted.get(row.id);
			if (!far) return [];
			const cells = far.profiles * far.workloads;
			const { runs, signed, taken, needed } = far;
			return [
				{
					id: row.id,
					slug: row.slug,
					name: row.name,
					dueAt: row.dueAt,
					createdAt: row.createdAt,
					state: campaignState({ archived: row.archivedAt !== null, runs, cells, signed }),
					rig: { slug: row.rigSlug, name: row.rigName, revision: row.rigRevision },
					progress: { taken, needed, cells, signed }
				}
			];
		})
	);
}
