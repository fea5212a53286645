import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { MeaningRemove } from '../../../schemas/firmware-meaning';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as meanings from '../../db/queries/firmware-meaning';

/** Takes a meaning out of the list; what it said stays in the audit log. */
export async function removeMeaning(
	ctx: Context,
	id: number,
	{ version }: MeaningRemove
): Promise<Outcome<null, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers remove meanings.');
	return inTransaction(ctx.db, async (tx) => {
		const before = await meanings.byId(tx, id);
		if (!before) return refuse('not_found', 'There is no such meaning.');
		if (!(await meanings.remove(tx, id, version))) return changedMeanwhile('meaning', before.version);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'meaning.remove',
				subjectKind: 'meaning',
				subjectId: id,
				before
			}
		]);
		return done(null);
	});
}
