import { open } from '$lib/server/http/guarded';
import { listArticles } from '$lib/server/services/reader/published-pages';
import type { PageServerLoadEvent } from './$types';

const pageOf = (url: URL) =>
	Math.min(1000, Math.max(1, Number.parseInt(url.searchParams.get('page') ?? '1', 10) || 1));

export const load = open(async ({ url }: PageServerLoadEvent, ctx) => {
	const page = pageOf(url);
	const template = url.searchParams.get('kind') ?? undefined;
	return { page, kind: template ?? null, ...(await listArticles(ctx, { page, template })) };
});
