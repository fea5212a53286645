import { may } from '$lib/domain/people/policy';
import { laddersQuery } from '$lib/schemas/ladder';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listLadders } from '$lib/server/services/stability/list-ladders';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(laddersQuery, url.searchParams);
	const found = valueOrError(await listLadders(ctx, query));
	return { title: 'Ladders', query, ...found, plans: may(ctx.actor, 'bench.plan') };
});
