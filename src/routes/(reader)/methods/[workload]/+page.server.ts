import { open, valueOrError } from '$lib/server/http/guarded';
import { readMethod } from '$lib/server/services/reader/published-pages';
import type { PageServerLoadEvent } from './$types';

export const load = open(async ({ params }: PageServerLoadEvent, ctx) => {
	const read = valueOrError(await readMethod(ctx, params.workload));
	return { title: read.workload.name, ...read };
});
