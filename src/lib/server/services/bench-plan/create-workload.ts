import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { WorkloadInput } from '../../../schemas/workload';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as workloads from '../../db/queries/workload';

/** Defines a workload and its protocol. */
export async function createWorkload(
	ctx: Context,
	input: WorkloadInput
): Promise<Outcome<{ id: number; slug: string }, 'forbidden' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers define workloads.');
	const slug = input.slug || slugOf(input.name);
	if (slug === '' || isReserved(slug)) return slugMissing();
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const id = await workloads.insert(tx, { ...input, slug, createdAt: ctx.now });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'workload.create',
					subjectKind: 'workload',
					subjectId: id,
					after: { ...input, slug }
				}
			]);
			return done({ id, slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('workload', slug);
		throw error;
	}
}
