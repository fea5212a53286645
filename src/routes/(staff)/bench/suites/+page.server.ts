import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { suitesQuery } from '$lib/schemas/suite';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listSuites } from '$lib/server/services/bench-plan/list-suites';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(suitesQuery, url.searchParams);
	const list = valueOrError(await listSuites(ctx, query));
	return { title: 'Suites', query, list, plans: may(ctx.actor, 'bench.plan') };
});
