import type { RequestEvent } from './$types';
import { watchQuery } from '$lib/schemas/campaign';
import { guardedApi } from '$lib/server/http/guarded';
import { problemFrom } from '$lib/server/http/problem';
import { campaignStream } from '$lib/server/live/campaign-stream';
import { watchCampaign } from '$lib/server/services/bench/watch-campaign';

/** What happens in the campaign, as it happens. A browser that lost the line goes on from the message it had last. */
export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const { after } = watchQuery.parse({
		after: event.request.headers.get('last-event-id') ?? event.url.searchParams.get('after')
	});
	const watched = await watchCampaign(ctx, event.params.campaign, after);
	return watched.ok ? campaignStream(event, ctx.actor.id, watched.value) : problemFrom(watched);
});
