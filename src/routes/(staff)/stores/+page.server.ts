import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { partsQuery } from '$lib/schemas/part';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listParts } from '$lib/server/services/stores/list-parts';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('stores.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(partsQuery, url.searchParams);
	const list = valueOrError(await listParts(ctx, query));
	return { title: 'Stores', query, list, edits: may(ctx.actor, 'stores.edit') };
});
