import { pictureLimitBytes } from '$lib/domain/articles/pictures/picture';
import { pictureQuery } from '$lib/schemas/picture';
import { answer, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { problemFrom } from '$lib/server/http/problem';
import { readUpload } from '$lib/server/http/read-upload';
import { storePicture } from '$lib/server/services/articles/store-picture';
import type { RequestEvent } from './$types';

/** The body is the picture. Sending it again has no further effect, so that it needs no key. */
export const POST = guardedApi('picture.store', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, pictureQuery);
	if (!query.ok) return query.response;
	const body = await readUpload(event, pictureLimitBytes);
	if (!body.ok) return problemFrom(body);
	const { name, ...words } = query.value;
	return answer(await storePicture(ctx, { ...words, fileName: name, bytes: body.value }), 201);
});
