import { workloadInput, workloadsApiQuery } from '$lib/schemas/workload';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createWorkload } from '$lib/server/services/bench-plan/create-workload';
import { listWorkloadsForApi, workloadForApi } from '$lib/server/services/bench-plan/workload-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, workloadsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listWorkloadsForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, workloadInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createWorkload(tx, body.value);
		if (!made.ok) return problemFrom(made);
		const whole = await workloadForApi(tx, String(made.value.id));
		return created(whole, (row) => `/api/v1/workloads/${row.slug}`);
	});
});
