import type { RequestEvent } from './$types';
import { runInput } from '$lib/schemas/run';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { recordRun } from '$lib/server/services/bench/record-run';

export const POST = guardedApi('run.record', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, runInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) =>
		answer(await recordRun(tx, event.params.campaign, body.value), 201)
	);
});
