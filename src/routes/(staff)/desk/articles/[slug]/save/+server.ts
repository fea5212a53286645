import { revisionSave } from '$lib/schemas/article';
import { answer, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { saveRevision } from '$lib/server/services/articles/save-revision';
import type { RequestEvent } from './$types';

/** The editor saves what was typed as the next revision. */
export const POST = guardedApi('article.edit', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, revisionSave);
	return body.ok ? answer(await saveRevision(ctx, event.params.slug, body.value)) : body.response;
});
