import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LabLimitInput } from '../../../schemas/lab-limit';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as limits from '../../db/queries/lab-limit';
import { limitTaken } from './limit-taken';

/** Writes a limit down. */
export async function createLabLimit(
	ctx: Context,
	input: LabLimitInput
): Promise<Outcome<{ id: number }, 'forbidden' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers write limits down.');
	const by = { createdBy: ctx.actor.id, createdAt: ctx.now };
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const id = await limits.insert(tx, { ...input, ...by });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'limit.create',
					subjectKind: 'limit',
					subjectId: id,
					after: input
				}
			]);
			return done({ id });
		});
	} catch (error) {
		if (isDuplicate(error)) return limitTaken(input);
		throw error;
	}
}
