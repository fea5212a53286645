import { presenceSaid } from '$lib/schemas/article';
import { answer, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { keepPresence } from '$lib/server/services/articles/keep-presence';
import type { RequestEvent } from './$types';

/** The editor says that it is open, and learns who else has it open. */
export const POST = guardedApi('article.edit', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, presenceSaid);
	return body.ok ? answer(await keepPresence(ctx, event.params.slug, body.value)) : body.response;
});
