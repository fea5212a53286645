import { termsQuery } from '$lib/schemas/glossary';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listTerms } from '$lib/server/services/articles/read-glossary';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('article.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(termsQuery, url.searchParams);
	return { title: 'Glossary', query, list: valueOrError(await listTerms(ctx, query)) };
});
