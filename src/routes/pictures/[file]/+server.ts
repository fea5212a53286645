import { Readable } from 'node:stream';
import { pictureWidth } from '$lib/schemas/picture';
import { open, valueOrError } from '$lib/server/http/guarded';
import { servePicture } from '$lib/server/services/articles/serve-picture';
import type { RequestEvent } from './$types';

/** A stored picture. What an address names never changes, so that a copy is good for ever. */
export const GET = open(async ({ params, url, request }: RequestEvent, ctx) => {
	const width = pictureWidth.parse(url.searchParams.get('w'));
	const { etag, type, bytes, stream, isPublic } = valueOrError(
		await servePicture(ctx, { file: params.file, width })
	);
	const headers = {
		etag,
		'cache-control': isPublic ? 'public, max-age=31536000, immutable' : 'private, no-cache',
		'content-security-policy': "default-src 'none'; sandbox"
	};
	if (request.headers.get('if-none-match') === etag) return new Response(null, { status: 304, headers });
	// Asked for the head alone, the file is not opened: nobody would close it.
	const body = request.method === 'HEAD' ? null : (Readable.toWeb(stream()) as ReadableStream);
	return new Response(body, {
		headers: { ...headers, 'content-type': type, 'content-length': String(bytes) }
	});
});
