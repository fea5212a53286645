import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LeaveInput } from '../../../schemas/people';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as apiTokens from '../../db/queries/api-tokens';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';
import * as sessions from '../../db/queries/sessions';
import { refuseForLastAdmin } from './last-admin';

/** Marks somebody as left: their name stays on what they did, their sessions and tokens end at once. */
export async function markLeft(
	ctx: Context,
	personId: string,
	{ reason, version }: LeaveInput
): Promise<Outcome<null, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'people.manage')) return refuse('forbidden', 'Only an admin marks somebody as left.');
	return inTransaction(ctx.db, async (tx) => {
		const last = await refuseForLastAdmin(tx, personId);
		if (last) return { ...last, fields: undefined };
		if (!(await people.byId(tx, personId))) return refuse('not_found', 'There is no such person.');
		if (!(await people.update(tx, personId, version, { leftAt: ctx.now }))) {
			return refuse(
				'conflict',
				'Somebody else changed this person meanwhile. Nothing was changed; look again.'
			);
		}
		await sessions.endAll(tx, personId);
		await apiTokens.revokeAll(tx, personId, ctx.now);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'person.leave',
				subjectKind: 'person',
				subjectId: personId,
				reason
			}
		]);
		return done(null);
	});
}
