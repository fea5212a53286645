import { exploreAsked } from '$lib/schemas/explore';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { drawPlate } from '$lib/server/rendering/draw-plate';
import { explore } from '$lib/server/services/bench/explore';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = exploreAsked(url.searchParams);
	const page = valueOrError(await explore(ctx, query));
	return {
		title: 'Explore',
		query,
		page,
		plates: (page.found?.plates ?? []).map((spec) => ({ spec, drawing: drawPlate(spec) }))
	};
});
