import type { RequestEvent } from './$types';
import { gridInput } from '$lib/schemas/run';
import { answer, readJson } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { recordGridReadings } from '$lib/server/services/bench/record-grid-readings';

/** What the entry grid sends; safe to send again. */
export const POST = guardedApi('run.record', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, gridInput);
	if (!body.ok) return body.response;
	return answer(await recordGridReadings(ctx, event.params.campaign, body.value));
});
