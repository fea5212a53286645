import { guardedApi } from '$lib/server/http/guarded';
import { byteStream } from '$lib/server/http/text-stream';
import { problemFrom } from '$lib/server/http/problem';
import { exportArticle } from '$lib/server/services/articles/export-article';
import type { RequestEvent } from './$types';

/** The article with its pictures as a zip. */
export const GET = guardedApi('article.read', async ({ params }: RequestEvent, ctx) => {
	const zip = await exportArticle(ctx, params.slug);
	if (!zip.ok) return problemFrom(zip);
	return new Response(byteStream(zip.value.content), {
		headers: {
			'content-type': 'application/zip',
			'content-disposition': `attachment; filename="${zip.value.fileName}"`,
			'cache-control': 'private, no-store'
		}
	});
});
