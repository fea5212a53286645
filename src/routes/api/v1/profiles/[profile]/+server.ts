import { answer } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { profileForApi } from '$lib/server/services/bench-plan/profile-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params, url }: RequestEvent, ctx) =>
	answer(await profileForApi(ctx, params.profile, url.searchParams.get('rig') ?? undefined))
);
