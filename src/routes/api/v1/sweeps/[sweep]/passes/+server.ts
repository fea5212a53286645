import { sweepInput } from '$lib/schemas/stability';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { recordPasses } from '$lib/server/services/stability/record-passes';
import type { RequestEvent } from './$types';

export const POST = guardedApi('run.record', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, sweepInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) =>
		answer(await recordPasses(tx, event.params.sweep, body.value.passes), 201)
	);
});
