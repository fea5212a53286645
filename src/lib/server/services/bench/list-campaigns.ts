import { campaignState, type CampaignState } from '../../../domain/bench/campaign-state';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CampaignsQuery } from '../../../schemas/campaign';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as progress from '../../db/queries/campaign-progress';
import * as settings from '../../db/queries/settings';

/** Campaigns of one page of the list. */
export const campaignsPerPage = 25;

export interface ListedCampaign {
	id: number;
	slug: string;
	name: string;
	rigSlug: string;
	rigName: string;
	rigRevision: number;
	dueAt: Date | null;
	createdAt: Date;
	state: CampaignState;
	profiles: number;
	workloads: number;
	taken: number;
	needed: number;
	cells: number;
	signed: number;
}

export interface CampaignList {
	rows: ListedCampaign[];
	total: number;
	page: number;
	pages: number;
	rigs: { slug: string; name: string }[];
	/** The publication's zone, in which dates are shown. */
	zone: string;
}

/** One page of campaigns with how far each is; the number of queries does not depend on the rows. */
export async function listCampaigns(ctx: Context, query: CampaignsQuery): Promise<Outcome<CampaignList>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const filter: campaigns.CampaignFilter = {
		text: query.q,
		rig: query.rig,
		state: query.state,
		sort: query.sort,
		// The newest first; the soonest due first; by name from A.
		way: query.sort === 'created' ? 'down' : 'up',
		limit: campaignsPerPage,
		offset: (query.page - 1) * campaignsPerPage
	};
	const [rows, total, rigs, { zone }] = await Promise.all([
		campaigns.list(ctx.db, filter),
		campaigns.total(ctx.db, filter),
		campaigns.rigsUsed(ctx.db),
		settings.publication(ctx.db)
	]);
	const counted = await progress.ofCampaigns(
		ctx.db,
		rows.map((row) => row.id)
	);
	const pages = Math.max(1, Math.ceil(total / campaignsPerPage));
	return done({
		rows: rows.flatMap(({ archivedAt, purpose: _purpose, version: _version, ...row }) => {
			const far = counted.get(row.id);
			if (!far) return [];
			const { runs, ...shown } = far;
			const cells = far.profiles * far.workloads;
			const state = campaignState({ archived: archivedAt !== null, runs, cells, signed: far.signed });
			return [{ ...row, ...shown, cells, state }];
		}),
		total,
		page: query.page,
		pages,
		rigs,
		zone
	});
}
