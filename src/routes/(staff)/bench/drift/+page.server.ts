import { driftQuery } from '$lib/schemas/drift';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { drawPlate } from '$lib/server/rendering/draw-plate';
import { readDrift } from '$lib/server/services/bench/read-drift';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await readDrift(ctx, driftQuery.parse(Object.fromEntries(url.searchParams))));
	return { title: 'Drift', page, drawing: page.plate && drawPlate(page.plate) };
});
