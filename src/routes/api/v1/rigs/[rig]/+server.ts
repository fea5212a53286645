import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { rigForApi } from '$lib/server/services/bench-plan/rig-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await rigForApi(ctx, params.rig))
);
