import { sampleInput, samplesApiQuery } from '$lib/schemas/sample';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createSample } from '$lib/server/services/stores/create-sample';
import { listSamplesForApi, sampleForApi } from '$lib/server/services/stores/sample-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('stores.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, samplesApiQuery);
	if (!query.ok) return query.response;
	const listed = await listSamplesForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('stores.edit', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, sampleInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createSample(tx, body.value);
		if (!made.ok) return problemFrom(made);
		const whole = await sampleForApi(tx, String(made.value.id));
		return created(whole, (row) => `/api/v1/samples/${row.slug}`);
	});
});
