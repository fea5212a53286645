import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { AttemptVoid } from '../../../schemas/ladder';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as attempts from '../../db/queries/attempt';
import * as audit from '../../db/queries/audit';
import * as ladders from '../../db/queries/ladder';
import { findLadder } from './find-ladder';

/** Takes an attempt out of what the ladder says, for good and with a reason; it stays on record. */
export async function voidAttempt(
	ctx: Context,
	ref: string,
	{ attempt: id, reason }: AttemptVoid
): Promise<Outcome<{ id: number }>> {
	if (!may(ctx.actor, 'run.void')) return refuse('forbidden', 'Only a tester voids attempts.');
	return inTransaction(ctx.db, async (tx) => {
		const found = await findLadder({ db: tx }, ref);
		if (!found.ok) return found;
		const ladder = await ladders.lock(tx, found.value.id);
		if (ladder?.archivedAt)
			return refuse(
				'conflict',
				'This ladder is archived. Nothing was changed; take it out of the archive first.'
			);
		const before = await attempts.lock(tx, found.value.id, id);
		if (!before) return refuse('not_found', 'There is no such attempt on this ladder.');
		if (before.voidedAt) return refuse('conflict', 'This attempt is voided already. Nothing was changed.');
		await attempts.markVoid(tx, id, {
			voidedAt: ctx.now,
			voidedBy: ctx.actor.id,
			voidReason: reason
		});
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'attempt.void',
				subjectKind: 'ladder',
				subjectId: found.value.id,
				before: { attempt: id, voided: false },
				after: { attempt: id, voided: true },
				reason
			}
		]);
		return done({ id });
	});
}
