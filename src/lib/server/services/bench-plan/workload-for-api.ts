import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { WorkloadsApiQuery } from '../../../schemas/workload';
import type { Context } from '../../context';
import * as workloads from '../../db/queries/workload';

type Row = Awaited<ReturnType<typeof workloads.list>>[number];

const describeWorkload = ({ version: _, ...row }: Row) => row;

export type WorkloadItem = ReturnType<typeof describeWorkload>;

/** Workloads in the order they were defined, one more than asked for where there are more. */
export async function listWorkloadsForApi(
	ctx: Context,
	query: WorkloadsApiQuery
): Promise<Outcome<WorkloadItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await workloads.list(ctx.db, { ...query, sort: 'id', way: 'up', ...window });
	return done(rows.map(describeWorkload));
}

/** A workload by slug or id. */
export async function workloadForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<WorkloadItem, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [row] = await workloads.byRefs(ctx.db, [ref]);
	return row
		? done(describeWorkload(row))
		: refuse('not_found', `There is no workload “${ref}” on the bench.`);
}
