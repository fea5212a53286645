import { suiteInput, suitesApiQuery } from '$lib/schemas/suite';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createSuite } from '$lib/server/services/bench-plan/create-suite';
import { listSuitesForApi, suiteForApi } from '$lib/server/services/bench-plan/suite-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, suitesApiQuery);
	if (!query.ok) return query.response;
	const listed = await listSuitesForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, suiteInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createSuite(tx, body.value);
		if (!made.ok) return problemFrom(made);
		return created(await suiteForApi(tx, String(made.value.id)), (row) => `/api/v1/suites/${row.slug}`);
	});
});
