import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as workloads from '../../db/queries/workload';

async function pageOf(ctx: Context, ref: string) {
	const [workload] = await workloads.byRefs(ctx.db, [ref]);
	if (!workload) return null;
	const [campaigns, measured] = await Promise.all([
		workloads.campaignsOf(ctx.db, [workload.id]),
		workloads.measured(ctx.db, [workload.id])
	]);
	return { workload, campaigns, measured: measured.has(workload.id) };
}

export type WorkloadPage = NonNullable<Awaited<ReturnType<typeof pageOf>>>;

/** A workload by slug or id with its protocol, the campaigns that run it, and whether it was measured. */
export async function showWorkload(
	ctx: Context,
	ref: string
): Promise<Outcome<WorkloadPage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const page = await pageOf(ctx, ref);
	return page ? done(page) : refuse('not_found', `There is no workload “${ref}” on the bench.`);
}
