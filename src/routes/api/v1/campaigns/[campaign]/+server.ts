import type { RequestEvent } from './$types';
import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { describeCampaign } from '$lib/server/services/bench/describe-campaign';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) =>
	answer(await describeCampaign(ctx, event.params.campaign))
);
