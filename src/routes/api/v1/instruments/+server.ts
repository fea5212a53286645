import { instrumentInput, instrumentsApiQuery } from '$lib/schemas/instrument';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createInstrument } from '$lib/server/services/bench-plan/create-instrument';
import { listInstrumentsForApi, instrumentForApi } from '$lib/server/services/bench-plan/instrument-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('bench.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, instrumentsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listInstrumentsForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('bench.plan', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, instrumentInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createInstrument(tx, body.value);
		if (!made.ok) return problemFrom(made);
		return created(
			await instrumentForApi(tx, String(made.value.id)),
			(row) => `/api/v1/instruments/${row.slug}`
		);
	});
});
