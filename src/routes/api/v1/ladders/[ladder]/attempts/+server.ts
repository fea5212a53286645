import { attemptsInput } from '$lib/schemas/stability';
import { answer, idempotent, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { recordAttempts } from '$lib/server/services/stability/record-attempts';
import type { RequestEvent } from './$types';

export const POST = guardedApi('run.record', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, attemptsInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) =>
		answer(await recordAttempts(tx, event.params.ladder, body.value.attempts), 201)
	);
});
