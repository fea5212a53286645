import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RunVoid } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as runs from '../../db/queries/run';
import { findOpenCampaign } from './find-campaign';
import { lockRun } from './find-run';
import { takeSignatureOff } from './take-signature-off';

/** Takes a whole run out of the figures, for good and with a reason; its readings stay on record. */
export async function voidRun(
	ctx: Context,
	campaignRef: string,
	input: RunVoid
): Promise<Outcome<{ signatureRemoved: boolean }>> {
	if (!may(ctx.actor, 'run.void')) return refuse('forbidden', 'Only a tester voids runs.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	return inTransaction(ctx.db, async (db) => {
		const tx = { ...ctx, db };
		const locked = await lockRun(tx, found.value.head.id, input.run);
		if (!locked.ok) return locked;
		const { run, cell } = locked.value;
		if (run.voidedAt) return refuse('conflict', 'This run is voided already. Nothing was changed.');
		await runs.markVoid(db, run.id, {
			voidedAt: ctx.now,
			voidedBy: ctx.actor.id,
			voidReason: input.reason
		});
		await audit.append(db, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'run.void',
				subjectKind: 'campaign',
				subjectId: cell.campaignId,
				before: { cell: cell.name, run: run.id, voided: false },
				after: { cell: cell.name, run: run.id, voided: true },
				reason: input.reason
			}
		]);
		return done({
			signatureRemoved: await takeSignatureOff(tx, cell, `Run ${run.id} was voided: ${input.reason}`)
		});
	});
}
