import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { LabLimitEdit } from '../../../schemas/lab-limit';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as limits from '../../db/queries/lab-limit';
import { limitTaken } from './limit-taken';

/** Changes a limit over the version that was seen; what it was stays in the audit log. */
export async function editLabLimit(
	ctx: Context,
	id: number,
	{ version, ...change }: LabLimitEdit
): Promise<Outcome<{ id: number }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change limits.');
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const before = await limits.byId(tx, id);
			if (!before) return refuse('not_found', 'There is no such limit.');
			if (!(await limits.update(tx, id, version, change))) return changedMeanwhile('limit', before.version);
			const was = Object.fromEntries(
				Object.keys(change).map((key) => [key, before[key as keyof typeof change]])
			);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'limit.edit',
					subjectKind: 'limit',
					subjectId: id,
					before: was,
					after: change
				}
			]);
			return done({ id });
		});
	} catch (error) {
		if (isDuplicate(error)) return limitTaken(change);
		throw error;
	}
}
