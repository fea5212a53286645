import { readListing } from '$lib/schemas/listing';
import { auditQuery } from '$lib/schemas/people';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listAudit } from '$lib/server/services/people/list-audit';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('audit.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(auditQuery, url.searchParams);
	return { title: 'Audit log', query, ...valueOrError(await listAudit(ctx, query)) };
});
