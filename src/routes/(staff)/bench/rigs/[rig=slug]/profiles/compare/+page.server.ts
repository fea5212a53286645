import { guarded, valueOrError } from '$lib/server/http/guarded';
import { compareProfiles } from '$lib/server/services/bench-plan/compare-profiles';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const [a, b] = ['a', 'b'].map((side) => url.searchParams.get(side)?.trim() ?? '');
	return {
		title: 'Compare profiles',
		...valueOrError(await compareProfiles(ctx, params.rig, a ?? '', b ?? '')),
		all: url.searchParams.get('show') === 'all'
	};
});
