import { error } from '@sveltejs/kit';
import { open, valueOrError } from '$lib/server/http/guarded';
import { readPlate } from '$lib/server/services/reader/published-pages';
import type { RequestEvent } from './$types';

const types = { svg: 'image/svg+xml', csv: 'text/csv; charset=utf-8; header=present' } as const;

/** A plate of the printed edition as a file: its drawing or its numbers. */
export const GET = open(async ({ params, request }: RequestEvent, ctx) => {
	const [, key = '', kind = ''] = /^([\w-]+)\.(svg|csv)$/.exec(params.file) ?? [];
	if (kind !== 'svg' && kind !== 'csv') error(404, 'There is no such plate.');
	const plate = valueOrError(await readPlate(ctx, params.slug, key));
	const headers = {
		etag: `"${plate.hash}-${key}-${kind}"`,
		'cache-control': 'public, max-age=0, must-revalidate',
		'content-disposition': `inline; filename="${params.slug}-${key}.${kind}"`,
		// A drawing opened on its own may style itself and do nothing else.
		'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox"
	};
	if (request.headers.get('if-none-match') === headers.etag)
		return new Response(null, { status: 304, headers });
	return new Response(plate[kind], { headers: { ...headers, 'content-type': types[kind] } });
});
