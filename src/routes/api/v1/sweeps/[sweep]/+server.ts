import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { sweepForApi } from '$lib/server/services/stability/sweep-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await sweepForApi(ctx, params.sweep))
);
