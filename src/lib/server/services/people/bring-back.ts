import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';

/** Lets somebody who had left sign in again, with the roles they still have; their old tokens stay revoked. */
export async function bringBack(
	ctx: Context,
	personId: string,
	version: number
): Promise<Outcome<null, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'people.manage')) return refuse('forbidden', 'Only an admin brings somebody back.');
	return inTransaction(ctx.db, async (tx) => {
		if (!(await people.byId(tx, personId))) return refuse('not_found', 'There is no such person.');
		if (!(await people.update(tx, personId, version, { leftAt: null }))) {
			return refuse(
				'conflict',
				'Somebody else changed this person meanwhile. Nothing was changed; look again.'
			);
		}
		await audit.append(tx, [
			{ at: ctx.now, actorId: ctx.actor.id, act: 'person.return', subjectKind: 'person', subjectId: personId }
		]);
		return done(null);
	});
}
