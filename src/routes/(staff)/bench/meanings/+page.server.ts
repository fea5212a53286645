import { may } from '$lib/domain/people/policy';
import { meaningsQuery } from '$lib/schemas/firmware-meaning';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listMeanings } from '$lib/server/services/bench-plan/list-meanings';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(meaningsQuery, url.searchParams);
	const list = valueOrError(await listMeanings(ctx, query));
	return { title: 'Firmware meanings', query, ...list, plans: may(ctx.actor, 'bench.plan') };
});
