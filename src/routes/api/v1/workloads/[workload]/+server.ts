import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { workloadForApi } from '$lib/server/services/bench-plan/workload-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await workloadForApi(ctx, params.workload))
);
