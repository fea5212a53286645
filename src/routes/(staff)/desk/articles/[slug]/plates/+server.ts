import { platesAsk } from '$lib/schemas/plate';
import { answer, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { drawPlates } from '$lib/server/services/articles/draw-plates';
import type { RequestEvent } from './$types';

/** Draws the plates of a text that is being written. */
export const POST = guardedApi('article.read', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, platesAsk);
	return body.ok ? answer(drawPlates(ctx, body.value.specs)) : body.response;
});
