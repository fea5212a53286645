import { open, valueOrError } from '$lib/server/http/guarded';
import { readPart } from '$lib/server/services/reader/published-pages';
import type { PageServerLoadEvent } from './$types';

export const load = open(async ({ params }: PageServerLoadEvent, ctx) => {
	const read = valueOrError(await readPart(ctx, params.slug));
	return { title: `${read.part.maker} ${read.part.model}`, ...read };
});
