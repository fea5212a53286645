import { may } from '../../../domain/people/policy';
import { grouped } from '../../../domain/shared/grouped';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { SuitesApiQuery } from '../../../schemas/suite';
import type { Context } from '../../context';
import * as suites from '../../db/queries/suite';
import { showSuite } from './show-suite';

type Row = Awaited<ReturnType<typeof suites.list>>[number];
type Workload = Awaited<ReturnType<typeof suites.workloadsOf>>[number];

const describeSuite = (row: Row, workloads: Workload[]) => ({
	id: row.id,
	slug: row.slug,
	name: row.name,
	purpose: row.purpose,
	workloads: workloads.map(({ slug, repeats }) => ({ workload: slug, repeats })),
	archived: row.archivedAt !== null,
	createdAt: row.createdAt,
	version: row.version
});

export type SuiteItem = ReturnType<typeof describeSuite>;

/** Suites in the order they were put together, one more than asked for where there are more. */
export async function listSuitesForApi(
	ctx: Context,
	query: SuitesApiQuery
): Promise<Outcome<SuiteItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const window = { limit: query.limit + 1, offset: 0 };
	const rows = await suites.list(ctx.db, { ...query, sort: 'id', way: 'up', ...window });
	const ids = rows.map((row) => row.id);
	const workloads = grouped(await suites.workloadsOf(ctx.db, ids), (row) => row.suiteId);
	return done(rows.map((row) => describeSuite(row, workloads.get(row.id) ?? [])));
}

/** A suite by slug or id. */
export async function suiteForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<SuiteItem, 'forbidden' | 'not_found'>> {
	const shown = await showSuite(ctx, ref);
	return shown.ok ? done(describeSuite(shown.value.suite, shown.value.workloads)) : shown;
}
