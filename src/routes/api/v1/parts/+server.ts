import { partInput, partsApiQuery } from '$lib/schemas/part';
import { created, idempotent, readJson, readQuery } from '$lib/server/http/api';
import { guardedApi } from '$lib/server/http/guarded';
import { page } from '$lib/server/http/paging';
import { problemFrom } from '$lib/server/http/problem';
import { createPart } from '$lib/server/services/stores/create-part';
import { listPartsForApi, partForApi } from '$lib/server/services/stores/part-for-api';
import type { RequestEvent } from './$types';

export const GET = guardedApi('stores.read', async (event: RequestEvent, ctx) => {
	const query = readQuery(event.url, partsApiQuery);
	if (!query.ok) return query.response;
	const listed = await listPartsForApi(ctx, query.value);
	return listed.ok
		? page(event.url, listed.value, { limit: query.value.limit }, (row) => row.id)
		: problemFrom(listed);
});

export const POST = guardedApi('stores.edit', async (event: RequestEvent, ctx) => {
	const body = await readJson(event, partInput);
	if (!body.ok) return body.response;
	return idempotent(event, ctx, async (tx) => {
		const made = await createPart(tx, body.value);
		if (!made.ok) return problemFrom(made);
		const whole = await partForApi(tx, String(made.value.id));
		return created(whole, (row) => `/api/v1/parts/${row.slug}`);
	});
});
