import { may } from '$lib/domain/people/policy';
import { readListing } from '$lib/schemas/listing';
import { samplesQuery } from '$lib/schemas/sample';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listSamples } from '$lib/server/services/stores/list-samples';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('stores.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(samplesQuery, url.searchParams);
	const list = valueOrError(await listSamples(ctx, query));
	return {
		title: 'Samples',
		query,
		list,
		edits: may(ctx.actor, 'stores.edit'),
		readsBench: may(ctx.actor, 'bench.read')
	};
});
