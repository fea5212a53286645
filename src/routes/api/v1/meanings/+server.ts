import { meaningInput, meaningsApiQuery } from '$lib/schemas/firmware-meaning';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createMeaning } from '$lib/server/services/bench-plan/create-meaning';
import { listMeaningsForApi, meaningForApi } from '$lib/server/services/bench-plan/meaning-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, meaningsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listMeaningsForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, meaningInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createMeaning(tx, body.value);
		if (!made.ok) return problemFrom(made);
		return created(await meaningForApi(tx, made.value.id), (row) => `/api/v1/meanings/${row.id}`);
	});
});
