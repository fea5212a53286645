import { instrumentEdit } from '$lib/schemas/instrument';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { problemFrom } from '$lib/server/http/problem';
import { editInstrument } from '$lib/server/services/bench-plan/edit-instrument';
import { instrumentForApi } from '$lib/server/services/bench-plan/instrument-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async ({ params }: RequestEvent, ctx) =>
	answer(await instrumentForApi(ctx, params.instrument))
);

export const PUT = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, instrumentEdit);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const edited = await editInstrument(tx, event.params.instrument, body.value);
		return edited.ok ? answer(await instrumentForApi(tx, edited.value.slug)) : problemFrom(edited);
	});
});
