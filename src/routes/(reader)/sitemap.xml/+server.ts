import { sitemap } from '$lib/domain/reader/sitemap';
import { open } from '$lib/server/http/guarded';
import { sitemapOf } from '$lib/server/services/reader/follow';
import type { RequestEvent } from './$types';

export const GET = open(
	async (_event: RequestEvent, ctx) =>
		new Response(sitemap(await sitemapOf(ctx)), {
			headers: {
				'content-type': 'application/xml; charset=utf-8',
				'cache-control': 'public, max-age=0, must-revalidate'
			}
		})
);
