import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { partForApi } from '$lib/server/services/stores/part-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('stores.read', async ({ params }: RequestEvent, ctx) =>
	answer(await partForApi(ctx, params.part))
);
