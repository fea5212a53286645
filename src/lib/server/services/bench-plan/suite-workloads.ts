import { nearest } from '../../../domain/shared/nearest';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { SuiteInput } from '../../../schemas/suite';
import type { Db } from '../../db/client';
import * as workloads from '../../db/queries/campaign-plan';

/** The workloads that a suite names by slug or id, in its order; refused beside the field when there is no such one. */
export async function suiteWorkloads(
	db: Db,
	chosen: SuiteInput['workloads']
): Promise<Outcome<{ workloadId: number; repeats: number }[], 'invalid'>> {
	const offered = await workloads.workloadChoices(db);
	const found = chosen.map(({ workload, repeats }) => ({
		ref: workload,
		repeats,
		row: offered.find((one) => one.slug === workload || String(one.id) === workload)
	}));
	const slugs = offered.map((one) => one.slug);
	const missing = found.flatMap(({ ref, row }) => {
		if (row) return [];
		const near = nearest(ref, slugs);
		const hint = near.length > 0 ? ` Did you mean ${near.join(', ')}?` : '';
		return [`There is no workload “${ref.slice(0, 80)}”.${hint}`];
	});
	if (missing.length > 0)
		return refuse('invalid', 'Nothing was saved: look at the workloads.', { fields: { workloads: missing } });
	const rows = found.flatMap(({ row, repeats }) =>
		row ? [{ workloadId: row.id, repeats: repeats ?? row.repeats }] : []
	);
	return new Set(rows.map((row) => row.workloadId)).size === rows.length
		? done(rows)
		: refuse('invalid', 'Nothing was saved: look at the workloads.', {
				fields: { workloads: ['A workload is in a suite once.'] }
			});
}
