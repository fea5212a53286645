import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { ladderForApi } from '$lib/server/services/stability/ladder-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await ladderForApi(ctx, params.ladder))
);
