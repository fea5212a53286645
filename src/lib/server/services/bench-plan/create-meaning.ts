import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { MeaningInput } from '../../../schemas/firmware-meaning';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as meanings from '../../db/queries/firmware-meaning';
import { meaningTaken } from './meaning-taken';

/** Writes a meaning down. */
export async function createMeaning(
	ctx: Context,
	input: MeaningInput
): Promise<Outcome<{ id: number }, 'forbidden' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers write meanings down.');
	const by = { createdBy: ctx.actor.id, createdAt: ctx.now };
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const id = await meanings.insert(tx, { ...input, ...by });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'meaning.create',
					subjectKind: 'meaning',
					subjectId: id,
					after: input
				}
			]);
			return done({ id });
		});
	} catch (error) {
		if (isDuplicate(error)) return meaningTaken(input);
		throw error;
	}
}
