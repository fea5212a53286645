import { paceQuery } from '$lib/schemas/narration';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readNarration } from '$lib/server/services/articles/read-narration';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('article.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const { pace } = paceQuery.parse(Object.fromEntries(url.searchParams));
	const narration = valueOrError(await readNarration(ctx, params.slug));
	return { ...narration, articleTitle: narration.title, title: `Prompter: ${narration.title}`, pace };
});
