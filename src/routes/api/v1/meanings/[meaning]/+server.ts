import { meaningEdit } from '$lib/schemas/firmware-meaning';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { idOf } from '$lib/server/http/id-of';
import { problemFrom } from '$lib/server/http/problem';
import { editMeaning } from '$lib/server/services/bench-plan/edit-meaning';
import { meaningForApi } from '$lib/server/services/bench-plan/meaning-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await meaningForApi(ctx, idOf(params.meaning)))
);

export const PUT = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, meaningEdit);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const edited = await editMeaning(tx, idOf(event.params.meaning), body.value);
		return edited.ok ? answer(await meaningForApi(tx, edited.value.id)) : problemFrom(edited);
	});
});
