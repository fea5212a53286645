import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as plans from '../../db/queries/campaign-plan';
import { cellName } from './find-cell';
import type { NamedCell } from './take-signature-off';

/** Locks one cell until the transaction ends; refused when it left the plan in the meantime. */
export async function lockCell(
	ctx: Context,
	campaignId: number,
	cell: { profile: { id: number; slug: string }; workload: { id: number; slug: string } }
): Promise<Outcome<NamedCell, 'conflict'>> {
	const named = {
		campaignId,
		profileId: cell.profile.id,
		workloadId: cell.workload.id,
		name: cellName(cell)
	};
	const locked = await plans.lockCells(ctx.db, named.campaignId, [named.profileId], [named.workloadId]);
	if (locked.profileIds.length === 1 && locked.needed.size === 1) return done(named);
	return refuse('conflict', 'This cell was just taken out of the campaign. Nothing was stored.');
}
