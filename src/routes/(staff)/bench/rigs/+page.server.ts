import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { rigsQuery } from '$lib/schemas/rig';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listRigs } from '$lib/server/services/bench-plan/list-rigs';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(rigsQuery, url.searchParams);
	const list = valueOrError(await listRigs(ctx, query));
	return { title: 'Rigs', query, list, plans: may(ctx.actor, 'bench.plan') };
});
