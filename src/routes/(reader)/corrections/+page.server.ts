import { open } from '$lib/server/http/guarded';
import { listCorrections } from '$lib/server/services/reader/published-pages';
import type { PageServerLoadEvent } from './$types';

export const load = open(async (_event: PageServerLoadEvent, ctx) => ({
	title: 'Corrections',
	corrections: await listCorrections(ctx)
}));
