import { may } from '$lib/domain/people/policy';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { showWorkload } from '$lib/server/services/bench-plan/show-workload';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await showWorkload(ctx, params.workload));
	return { title: page.workload.name, ...page, plans: may(ctx.actor, 'bench.plan') };
});
