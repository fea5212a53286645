import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listLoans, listPartners } from '$lib/server/services/partners/list-partners';
import { openStages } from '$lib/domain/stores/loan';
import { partnersQuery } from '$lib/schemas/partner';
import { readListing } from '$lib/schemas/listing';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('partner.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(partnersQuery, url.searchParams);
	const [partners, loans] = await Promise.all([listPartners(ctx, query), listLoans(ctx, [...openStages])]);
	return { title: 'Partners', query, ...valueOrError(partners), loans: valueOrError(loans) };
});
