import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ChosenUnsign } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as plans from '../../db/queries/campaign-plan';
import { findOpenCampaign } from './find-campaign';
import { cellName, findCells } from './find-cell';
import { takeSignaturesOff } from './take-signature-off';

/** Takes the signatures of chosen cells back, with one reason for all; says how many there were. */
export async function unsignChosenCells(
	ctx: Context,
	campaignRef: string,
	input: ChosenUnsign
): Promise<Outcome<{ removed: number; chosen: number }>> {
	if (!may(ctx.actor, 'cell.sign')) return refuse('forbidden', 'Only a tester takes a signature back.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { head } = found.value;
	const cells = findCells(found.value, input.cell);
	if (!cells.ok) return cells;
	return inTransaction(ctx.db, async (db) => {
		await plans.lockCells(
			db,
			head.id,
			[...new Set(cells.value.map((cell) => cell.profile.id))],
			[...new Set(cells.value.map((cell) => cell.workload.id))]
		);
		const named = cells.value.map((cell) => ({
			campaignId: head.id,
			profileId: cell.profile.id,
			workloadId: cell.workload.id,
			name: cellName(cell)
		}));
		const removed = await takeSignaturesOff({ ...ctx, db }, named, input.reason);
		return removed > 0
			? done({ removed, chosen: named.length })
			: refuse('conflict', 'None of these cells bears a signature. Nothing was changed.');
	});
}
