import { may } from '$lib/domain/people/policy';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { showSample } from '$lib/server/services/stores/show-sample';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('stores.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await showSample(ctx, params.slug));
	return {
		title: page.sample.slug,
		...page,
		edits: may(ctx.actor, 'stores.edit'),
		readsBench: may(ctx.actor, 'bench.read'),
		readsPartners: may(ctx.actor, 'partner.read')
	};
});
