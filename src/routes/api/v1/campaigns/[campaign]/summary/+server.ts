import type { RequestEvent } from './$types';
import { summaryQuery } from '$lib/schemas/campaign';
import { answer, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { summariseCells } from '$lib/server/services/bench/summarise-cells';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, summaryQuery);
	if (!query.ok) return query.response;
	return answer(await summariseCells(ctx, event.params.campaign, query.value.baseline ?? null));
});
