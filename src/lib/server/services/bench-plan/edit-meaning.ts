import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { MeaningEdit } from '../../../schemas/firmware-meaning';
import type { Context } from '../../context';
import { inTransaction, isDuplicate } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as meanings from '../../db/queries/firmware-meaning';
import { meaningTaken } from './meaning-taken';

/** Changes a meaning over the version that was seen; what it was stays in the audit log. */
export async function editMeaning(
	ctx: Context,
	id: number,
	{ version, ...change }: MeaningEdit
): Promise<Outcome<{ id: number }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change meanings.');
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const before = await meanings.byId(tx, id);
			if (!before) return refuse('not_found', 'There is no such meaning.');
			if (!(await meanings.update(tx, id, version, change)))
				return changedMeanwhile('meaning', before.version);
			const was = Object.fromEntries(
				Object.keys(change).map((key) => [key, before[key as keyof typeof change]])
			);
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'meaning.edit',
					subjectKind: 'meaning',
					subjectId: id,
					before: was,
					after: change
				}
			]);
			return done({ id });
		});
	} catch (error) {
		if (isDuplicate(error)) return meaningTaken(change);
		throw error;
	}
}
