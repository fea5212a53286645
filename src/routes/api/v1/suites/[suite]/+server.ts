import { suiteEdit } from '$lib/schemas/suite';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { problemFrom } from '$lib/server/http/problem';
import { editSuite } from '$lib/server/services/bench-plan/edit-suite';
import { suiteForApi } from '$lib/server/services/bench-plan/suite-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await suiteForApi(ctx, params.suite))
);

export const PUT = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, suiteEdit);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const edited = await editSuite(tx, event.params.suite, body.value);
		return edited.ok ? answer(await suiteForApi(tx, edited.value.slug)) : problemFrom(edited);
	});
});
