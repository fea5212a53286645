import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { sampleForApi } from '$lib/server/services/stores/sample-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('stores.read', async ({ params }: RequestEvent, ctx) =>
	answer(await sampleForApi(ctx, params.sample))
);
