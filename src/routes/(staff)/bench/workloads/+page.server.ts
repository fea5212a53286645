import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { workloadsQuery } from '$lib/schemas/workload';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listWorkloads } from '$lib/server/services/bench-plan/list-workloads';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(workloadsQuery, url.searchParams);
	const list = valueOrError(await listWorkloads(ctx, query));
	return { title: 'Workloads', query, list, plans: may(ctx.actor, 'bench.plan') };
});
