import { labLimitInput, limitsApiQuery } from '$lib/schemas/lab-limit';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createLabLimit } from '$lib/server/services/bench-plan/create-limit';
import { listLimitsForApi, limitForApi } from '$lib/server/services/bench-plan/limit-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, limitsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listLimitsForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, labLimitInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createLabLimit(tx, body.value);
		if (!made.ok) return problemFrom(made);
		return created(await limitForApi(tx, made.value.id), (row) => `/api/v1/limits/${row.id}`);
	});
});
