import { open, valueOrError } from '$lib/server/http/guarded';
import { readArticle } from '$lib/server/services/reader/published-pages';
import type { PageServerLoadEvent } from './$types';

export const load = open(async ({ params, setHeaders }: PageServerLoadEvent, ctx) => {
	const read = valueOrError(await readArticle(ctx, params.slug));
	setHeaders({ 'cache-control': 'public, max-age=0, must-revalidate' });
	return { title: read.article.title, canonical: `${ctx.origin}/articles/${params.slug}`, ...read };
});
