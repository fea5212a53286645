import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { SweepPlan } from '../../../schemas/sweep';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as sweeps from '../../db/queries/sweep';
import { chooseRigAndProfile, chooseWorkloads } from './choose';

/** Begins a sweep on a rig as it stands now, over one of its profiles. */
export async function createSweep(
	ctx: Context,
	{ rig: rigRef, profile: profileRef, workload: workloadRef, ...input }: SweepPlan
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers begin sweeps.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const chosen = await chooseRigAndProfile(tx, { rig: rigRef, profile: profileRef });
			if (!chosen.ok) return chosen;
			const { rig, profile } = chosen.value;
			const workloads = await chooseWorkloads(tx, [{ field: 'workload', ref: workloadRef }]);
			if (!workloads.ok) return workloads;
			const [workload] = workloads.value;
			if (!workload) throw new Error('A workload was chosen and then was not.');
			const row = {
				...input,
				slug,
				rigRevisionId: rig.revisionId,
				profileId: profile.id,
				workloadId: workload.id,
				createdBy: ctx.actor.id,
				createdAt: ctx.now
			};
			const id = await sweeps.insert(tx, row);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'sweep.create',
					subjectKind: 'sweep',
					subjectId: id,
					after: {
						...input,
						slug,
						rig: rig.slug,
						revision: rig.revision,
						profile: profile.slug,
						workload: workload.slug
					}
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('sweep', slug);
		throw error;
	}
}
