import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { LadderInput } from '../../../schemas/ladder';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as ladders from '../../db/queries/ladder';
import { chooseRigAndProfile, chooseWorkloads } from './choose';

/** Begins a ladder on a rig as it stands now, over one of its profiles. */
export async function createLadder(
	ctx: Context,
	{ rig: rigRef, profile: profileRef, stresses, ...input }: LadderInput
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers begin ladders.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const chosen = await chooseRigAndProfile(tx, { rig: rigRef, profile: profileRef });
			if (!chosen.ok) return chosen;
			const { rig, profile } = chosen.value;
			const asked = stresses.map(({ workload }, at) => ({
				field: `stresses.${at}.workload`,
				ref: workload
			}));
			const workloads = await chooseWorkloads(tx, asked);
			if (!workloads.ok) return workloads;
			const rows = stresses.flatMap(({ kind, minutes }, at) => {
				const workload = workloads.value[at];
				return workload ? [{ workloadId: workload.id, kind, minutes }] : [];
			});
			if (new Set(rows.map((row) => row.workloadId)).size < rows.length)
				return refuse('invalid', 'Nothing was saved: a stress is on a ladder once.', {
					fields: { stresses: ['A stress is on a ladder once.'] }
				});
			const row = {
				...input,
				slug,
				rigRevisionId: rig.revisionId,
				profileId: profile.id,
				createdBy: ctx.actor.id,
				createdAt: ctx.now
			};
			const id = await ladders.insert(tx, row, rows);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'ladder.create',
					subjectKind: 'ladder',
					subjectId: id,
					after: { ...input, slug, rig: rig.slug, revision: rig.revision, profile: profile.slug, stresses }
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('ladder', slug);
		throw error;
	}
}
