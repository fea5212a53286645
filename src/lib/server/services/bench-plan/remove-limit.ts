import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { LabLimitRemove } from '../../../schemas/lab-limit';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as limits from '../../db/queries/lab-limit';

/** Takes a limit out of the list; what it said stays in the audit log. */
export async function removeLabLimit(
	ctx: Context,
	id: number,
	{ version }: LabLimitRemove
): Promise<Outcome<null, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers remove limits.');
	return inTransaction(ctx.db, async (tx) => {
		const before = await limits.byId(tx, id);
		if (!before) return refuse('not_found', 'There is no such limit.');
		if (!(await limits.remove(tx, id, version))) return changedMeanwhile('limit', before.version);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'limit.remove',
				subjectKind: 'limit',
				subjectId: id,
				before
			}
		]);
		return done(null);
	});
}
