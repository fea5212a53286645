import { sweepPlan, sweepsApiQuery } from '$lib/schemas/sweep';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createSweep } from '$lib/server/services/stability/create-sweep';
import { listSweepsForApi, sweepForApi } from '$lib/server/services/stability/sweep-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, sweepsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listSweepsForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, sweepPlan);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createSweep(tx, body.value);
		if (!made.ok) return problemFrom(made);
		const whole = await sweepForApi(tx, String(made.value.id));
		return created(whole, (row) => `/api/v1/sweeps/${row.slug}`);
	});
});
