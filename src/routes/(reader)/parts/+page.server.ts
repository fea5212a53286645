import { open } from '$lib/server/http/guarded';
import { listParts } from '$lib/server/services/reader/published-pages';
import type { PageServerLoadEvent } from './$types';

export const load = open(async (_event: PageServerLoadEvent, ctx) => ({
	title: 'Parts',
	parts: await listParts(ctx)
}));
