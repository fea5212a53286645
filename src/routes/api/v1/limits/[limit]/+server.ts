import { labLimitEdit } from '$lib/schemas/lab-limit';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { idOf } from '$lib/server/http/id-of';
import { problemFrom } from '$lib/server/http/problem';
import { editLabLimit } from '$lib/server/services/bench-plan/edit-limit';
import { limitForApi } from '$lib/server/services/bench-plan/limit-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await limitForApi(ctx, idOf(params.limit)))
);

export const PUT = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, labLimitEdit);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const edited = await editLabLimit(tx, idOf(event.params.limit), body.value);
		return edited.ok ? answer(await limitForApi(tx, edited.value.id)) : problemFrom(edited);
	});
});
