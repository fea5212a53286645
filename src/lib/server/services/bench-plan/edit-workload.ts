import { may } from '../../../domain/people/policy';
import { done, refuse, type FieldErrors, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { WorkloadEdit } from '../../../schemas/workload';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as workloads from '../../db/queries/workload';

type Meaning = Pick<WorkloadEdit, 'quantity' | 'unit' | 'better'>;

/** What gives stored readings their meaning and so cannot change under them. */
function frozen(before: Meaning, after: Meaning): FieldErrors | null {
	const words = { quantity: 'the quantity', unit: 'the unit', better: 'the direction' } as const;
	const changed = (['quantity', 'unit', 'better'] as const).filter((key) => before[key] !== after[key]);
	if (changed.length === 0) return null;
	return Object.fromEntries(
		changed.map((key) => [
			key,
			[`Runs are stored under “${before[key]}”, so ${words[key]} stays. Make a new version to change it.`]
		])
	);
}

/** Changes a workload over the version that was seen; what its stored readings mean stays as it is. */
export async function editWorkload(
	ctx: Context,
	ref: string,
	{ version, ...change }: WorkloadEdit
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change workloads.');
	return inTransaction(ctx.db, async (tx) => {
		const [found] = await workloads.byRefs(tx, [ref]);
		const before = found && (await workloads.lock(tx, found.id));
		if (!before) return refuse('not_found', `There is no workload “${ref}” on the bench.`);
		const fields = frozen(before, change);
		if (fields && (await workloads.measured(tx, [before.id])).size > 0)
			return refuse(
				'conflict',
				'Nothing was saved: this workload was measured, and a change here would change what its readings mean. Make a new version of it instead.',
				{ fields }
			);
		if (!(await workloads.update(tx, before.id, version, change)))
			return changedMeanwhile('workload', before.version);
		const was = Object.fromEntries(
			Object.keys(change).map((key) => [key, before[key as keyof typeof change]])
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'workload.edit',
				subjectKind: 'workload',
				subjectId: before.id,
				before: was,
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}
