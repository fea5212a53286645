import { historyQuery } from '$lib/schemas/campaign';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readHistory } from '$lib/server/services/bench/read-history';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const query = readListing(historyQuery, url.searchParams);
	const history = valueOrError(await readHistory(ctx, params.campaign, query));
	return { title: `History of ${history.plan.head.name}`, query, history };
});
