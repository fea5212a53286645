import { tradeOffQuery } from '$lib/schemas/campaign';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { drawPlate } from '$lib/server/rendering/draw-plate';
import { readTradeOffs } from '$lib/server/services/bench/read-trade-offs';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const asked = tradeOffQuery.safeParse(Object.fromEntries(url.searchParams)).data;
	const page = valueOrError(
		await readTradeOffs(ctx, params.campaign, {
			baseline: asked?.baseline ?? null,
			part: asked?.part ?? null
		})
	);
	return {
		title: `${page.name}, trade-offs`,
		page,
		plates: page.plates.map((spec) => ({ spec, drawing: drawPlate(spec) }))
	};
});
