import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as history from '../../db/queries/campaign-history';
import * as settings from '../../db/queries/settings';
import { findCampaign } from './find-campaign';

/** Entries of one page of the history. */
export const entriesPerPage = 50;

export interface History {
	plan: CampaignPlan;
	entries: Awaited<ReturnType<typeof history.list>>;
	total: number;
	page: number;
	pages: number;
	zone: string;
}

/** What happened in a campaign, newest first: who, when, what, before, after, why. */
export async function readHistory(
	ctx: Context,
	campaignRef: string,
	{ cell, page }: { cell: string; page: number }
): Promise<Outcome<History>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { id } = found.value.head;
	const [entries, total, { zone }] = await Promise.all([
		history.list(ctx.db, id, { cell, limit: entriesPerPage, offset: (page - 1) * entriesPerPage }),
		history.total(ctx.db, id, cell),
		settings.publication(ctx.db)
	]);
	const pages = Math.max(1, Math.ceil(total / entriesPerPage));
	return done({ plan: found.value, entries, total, page, pages, zone });
}
