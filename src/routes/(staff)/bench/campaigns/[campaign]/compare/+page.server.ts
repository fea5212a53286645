import { summaryQuery } from '$lib/schemas/campaign';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { drawPlate } from '$lib/server/rendering/draw-plate';
import { readComparison } from '$lib/server/services/bench/read-comparison';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const asked = summaryQuery.safeParse({ baseline: url.searchParams.get('baseline') ?? undefined });
	const comparison = valueOrError(await readComparison(ctx, params.campaign, asked.data?.baseline ?? null));
	return {
		title: `${comparison.name}, compared`,
		comparison,
		plates: comparison.plates.map((spec) => ({ spec, drawing: drawPlate(spec) }))
	};
});
