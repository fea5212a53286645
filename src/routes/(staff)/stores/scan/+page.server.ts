import { redirect } from '@sveltejs/kit';
import { readListing } from '$lib/schemas/listing';
import { scanQuery } from '$lib/schemas/sample-code';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { findSample } from '$lib/server/services/stores/find-sample';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('stores.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const { code } = readListing(scanQuery, url.searchParams);
	const found = valueOrError(await findSample(ctx, code));
	if (found.exact) redirect(303, `/stores/samples/${found.exact.slug}`);
	return { title: 'Find a sample', typed: code, found };
});
