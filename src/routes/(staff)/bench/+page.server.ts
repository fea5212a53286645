import { may } from '$lib/domain/people/policy';
import { campaignsQuery } from '$lib/schemas/campaign';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listCampaigns } from '$lib/server/services/bench/list-campaigns';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(campaignsQuery, url.searchParams);
	const list = valueOrError(await listCampaigns(ctx, query));
	return { title: 'Bench', query, list, plans: may(ctx.actor, 'bench.plan') };
});
