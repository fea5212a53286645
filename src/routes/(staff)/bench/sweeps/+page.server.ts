import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { sweepsQuery } from '$lib/schemas/sweep';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listSweeps } from '$lib/server/services/stability/list-sweeps';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(sweepsQuery, url.searchParams);
	const found = valueOrError(await listSweeps(ctx, query));
	return { title: 'Sweeps', query, ...found, plans: may(ctx.actor, 'bench.plan') };
});
