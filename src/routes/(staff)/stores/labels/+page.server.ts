import { labelsPerSheet, labelsQuery } from '$lib/schemas/sample-code';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { drawLabels } from '$lib/server/services/stores/draw-labels';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('stores.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const asked = url.searchParams.getAll('sample');
	const refs = labelsQuery.safeParse(asked.slice(0, labelsPerSheet).filter(Boolean)).data ?? [];
	return {
		title: 'Labels',
		...valueOrError(await drawLabels(ctx, refs)),
		left: Math.max(0, asked.length - labelsPerSheet)
	};
});
