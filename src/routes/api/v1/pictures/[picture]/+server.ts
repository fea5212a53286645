import { pictureWords } from '$lib/schemas/picture';
import { answer, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { describePicture } from '$lib/server/services/articles/store-picture';
import type { RequestEvent } from './$types';

export const PATCH = guardedApi('picture.store', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, pictureWords);
	return body.ok ? answer(await describePicture(ctx, event.params.picture, body.value)) : body.response;
});
