import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { SuitesQuery } from '../../../schemas/suite';
import type { Context } from '../../context';
import * as suites from '../../db/queries/suite';

export type SuiteRow = Awaited<ReturnType<typeof suites.list>>[number] & {
	workloads: Awaited<ReturnType<typeof suites.workloadsOf>>;
};

/** One page of the suites with their workloads. */
export async function listSuites(
	ctx: Context,
	query: SuitesQuery
): Promise<Outcome<Paged<SuiteRow>, 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [rows, total] = await Promise.all([
		suites.list(ctx.db, { ...query, limit: pageSize, offset: (query.page - 1) * pageSize }),
		suites.total(ctx.db, query)
	]);
	const ids = rows.map((row) => row.id);
	const workloads = grouped(await suites.workloadsOf(ctx.db, ids), (row) => row.suiteId);
	return done(
		paged(
			rows.map((row) => ({ ...row, workloads: workloads.get(row.id) ?? [] })),
			total,
			query.page
		)
	);
}
