import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PassVoid } from '../../../schemas/sweep';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as sweeps from '../../db/queries/sweep';
import * as passes from '../../db/queries/sweep-pass';
import { findSweep } from './find-sweep';

/** Takes a pass out of what the sweep says, for good and with a reason; its points stay on record. */
export async function voidPass(
	ctx: Context,
	ref: string,
	{ pass: id, reason }: PassVoid
): Promise<Outcome<{ number: number }>> {
	if (!may(ctx.actor, 'run.void')) return refuse('forbidden', 'Only a tester voids passes.');
	return inTransaction(ctx.db, async (tx) => {
		const found = await findSweep({ db: tx }, ref);
		if (!found.ok) return found;
		const sweep = await sweeps.lock(tx, found.value.id);
		if (sweep?.archivedAt)
			return refuse(
				'conflict',
				'This sweep is archived. Nothing was changed; take it out of the archive first.'
			);
		const before = await passes.lock(tx, found.value.id, id);
		if (!before) return refuse('not_found', 'There is no such pass of this sweep.');
		if (before.voidedAt) return refuse('conflict', 'This pass is voided already. Nothing was changed.');
		await passes.markVoid(tx, id, {
			voidedAt: ctx.now,
			voidedBy: ctx.actor.id,
			voidReason: reason
		});
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'sweep.void',
				subjectKind: 'sweep',
				subjectId: found.value.id,
				before: { pass: before.number, voided: false },
				after: { pass: before.number, voided: true },
				reason
			}
		]);
		return done({ number: before.number });
	});
}
