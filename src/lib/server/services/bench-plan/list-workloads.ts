import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { WorkloadsQuery } from '../../../schemas/workload';
import type { Context } from '../../context';
import * as workloads from '../../db/queries/workload';

export type WorkloadRow = Awaited<ReturnType<typeof workloads.list>>[number] & { campaigns: number };

/** One page of the workloads with how many campaigns run each. */
export async function listWorkloads(
	ctx: Context,
	query: WorkloadsQuery
): Promise<Outcome<Paged<WorkloadRow>, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rows, total] = await Promise.all([
		workloads.list(ctx.db, { ...query, limit: pageSize, offset: (query.page - 1) * pageSize }),
		workloads.total(ctx.db, query)
	]);
	const counts = await workloads.campaignCounts(
		ctx.db,
		rows.map((row) => row.id)
	);
	const countOf = new Map(counts.map((row) => [row.workloadId, row.n]));
	return done(
		paged(
			rows.map((row) => ({ ...row, campaigns: countOf.get(row.id) ?? 0 })),
			total,
			query.page
		)
	);
}
