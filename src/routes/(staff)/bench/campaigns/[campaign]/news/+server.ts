import type { RequestEvent } from './$types';
import { boardNewsQuery } from '$lib/schemas/campaign';
import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { readBoardNews } from '$lib/server/services/bench/read-board';

/** What changed on the board since the one that the page has. */
export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = boardNewsQuery.parse(Object.fromEntries(event.url.searchParams));
	return answer(await readBoardNews(ctx, event.params.campaign, query));
});
