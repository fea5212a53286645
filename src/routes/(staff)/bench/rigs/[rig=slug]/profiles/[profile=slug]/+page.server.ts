import { may } from '$lib/domain/people/policy';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { showProfile } from '$lib/server/services/bench-plan/show-profile';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await showProfile(ctx, params.rig, params.profile));
	return {
		title: page.profile.name,
		...page,
		plans: may(ctx.actor, 'bench.plan'),
		all: url.searchParams.get('steps') === 'all'
	};
});
