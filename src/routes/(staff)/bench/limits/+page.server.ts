import { may } from '$lib/domain/people/policy';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { listLimits } from '$lib/server/services/bench-plan/list-limits';
import type { PageServerLoadEvent } from './$types';

export const load = guarded('bench.read', async (_event: PageServerLoadEvent, ctx) => ({
	title: 'Limits',
	rows: valueOrError(await listLimits(ctx)),
	plans: may(ctx.actor, 'bench.plan')
}));
