import { comparisonCsv } from '$lib/domain/bench/comparison-csv';
import { summaryQuery } from '$lib/schemas/campaign';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readComparison } from '$lib/server/services/bench/read-comparison';
import type { RequestEvent } from './$types';

export const GET = guarded('bench.read', async ({ params, url }: RequestEvent, ctx) => {
	const asked = summaryQuery.safeParse({ baseline: url.searchParams.get('baseline') ?? undefined });
	const comparison = valueOrError(await readComparison(ctx, params.campaign, asked.data?.baseline ?? null));
	return new Response(comparisonCsv(comparison), {
		headers: {
			'content-type': 'text/csv; charset=utf-8',
			'content-disposition': `attachment; filename="${comparison.campaign}-against-${comparison.baseline}.csv"`,
			'cache-control': 'no-store'
		}
	});
});
