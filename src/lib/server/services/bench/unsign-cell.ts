import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CellUnsign } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import { findOpenCampaign } from './find-campaign';
import { findCell } from './find-cell';
import { lockCell } from './lock-cell';
import { takeSignatureOff } from './take-signature-off';

/** Takes a signature back, with a reason. */
export async function unsignCell(
	ctx: Context,
	campaignRef: string,
	input: CellUnsign
): Promise<Outcome<null>> {
	if (!may(ctx.actor, 'cell.sign')) return refuse('forbidden', 'Only a tester takes a signature back.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const at = findCell(found.value, input);
	if (!at.ok) return at;
	return inTransaction(ctx.db, async (db) => {
		const tx = { ...ctx, db };
		const cell = await lockCell(tx, found.value.head.id, at.value);
		if (!cell.ok) return cell;
		const removed = await takeSignatureOff(tx, cell.value, input.reason);
		return removed ? done(null) : refuse('conflict', 'This cell bears no signature. Nothing was changed.');
	});
}
