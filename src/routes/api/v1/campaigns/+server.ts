import type { RequestEvent } from './$types';
import { campaignInput, campaignsApiQuery } from '$lib/schemas/campaign';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { listForApi } from '$lib/server/services/bench/list-for-api';
import { planCampaign } from '$lib/server/services/bench/plan-campaign';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, campaignsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, campaignInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) =>
		created(await planCampaign(tx, body.value), (row) => `/api/v1/campaigns/${row.slug}`)
	);
});
