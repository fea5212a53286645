import { error } from '@sveltejs/kit';
import { guardedApi, valueOrError } from '$lib/server/http/guarded';
import { readDraftPlate } from '$lib/server/services/articles/read-draft-plate';
import type { RequestEvent } from './$types';

const types = { svg: 'image/svg+xml', csv: 'text/csv; charset=utf-8; header=present' } as const;

/** A plate of a text that is being written, as a file. */
export const GET = guardedApi('article.read', async ({ params }: RequestEvent, ctx) => {
	const [, key = '', kind = ''] = /^([\w-]+)\.(svg|csv)$/.exec(params.file) ?? [];
	if (kind !== 'svg' && kind !== 'csv') error(404, 'There is no such plate.');
	const body = valueOrError(await readDraftPlate(ctx, params.slug, { key, kind }));
	return new Response(body, {
		headers: {
			'content-type': types[kind],
			'cache-control': 'private, no-store',
			'content-disposition': `inline; filename="${params.slug}-${key}.${kind}"`,
			// A drawing opened on its own may style itself and do nothing else.
			'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox"
		}
	});
});
