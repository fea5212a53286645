import { may } from '$lib/domain/people/policy';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { showRig } from '$lib/server/services/bench-plan/show-rig';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await showRig(ctx, params.rig));
	return { title: page.rig.name, ...page, plans: may(ctx.actor, 'bench.plan') };
});
