import { may } from '$lib/domain/people/policy';
import { instrumentsQuery } from '$lib/schemas/instrument';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listInstruments } from '$lib/server/services/bench-plan/list-instruments';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(instrumentsQuery, url.searchParams);
	const list = valueOrError(await listInstruments(ctx, query));
	return { title: 'Instruments', query, list, plans: may(ctx.actor, 'bench.plan') };
});
