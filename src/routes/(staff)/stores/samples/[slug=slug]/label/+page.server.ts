import { error } from '@sveltejs/kit';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { drawLabels } from '$lib/server/services/stores/draw-labels';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('stores.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const [label] = valueOrError(await drawLabels(ctx, [params.slug])).labels;
	if (!label) error(404, `There is no sample “${params.slug}” in the stores.`);
	return { title: `Label of ${label.slug}`, label };
});
