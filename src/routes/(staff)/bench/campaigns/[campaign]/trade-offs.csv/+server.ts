import { tradeOffCsv } from '$lib/domain/bench/trade-off-csv';
import { tradeOffQuery } from '$lib/schemas/campaign';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { readTradeOffs } from '$lib/server/services/bench/read-trade-offs';
import type { RequestEvent } from './$types';

export const GET = guarded('bench.read', async ({ params, url }: RequestEvent, ctx) => {
	const asked = tradeOffQuery.safeParse(Object.fromEntries(url.searchParams)).data;
	const page = valueOrError(
		await readTradeOffs(ctx, params.campaign, {
			baseline: asked?.baseline ?? null,
			part: asked?.part ?? null
		})
	);
	return new Response(tradeOffCsv(page.baseline.slug, page.sides, page.values), {
		headers: {
			'content-type': 'text/csv; charset=utf-8',
			'content-disposition': `attachment; filename="${page.campaign}-trade-offs.csv"`,
			'cache-control': 'no-store'
		}
	});
});
