import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as plans from '../../db/queries/campaign-plan';
import * as runs from '../../db/queries/run';
import type { NamedCell } from './take-signature-off';

export type LockedRun = NonNullable<Awaited<ReturnType<typeof runs.lock>>>;

/** A run of a campaign with its cell, both locked until the transaction ends: the cell first, as everywhere. */
export async function lockRun(
	ctx: Context,
	campaignId: number,
	runId: number
): Promise<Outcome<{ run: LockedRun; cell: NamedCell }, 'not_found'>> {
	const at = await runs.cellOf(ctx.db, runId);
	if (at?.campaignId !== campaignId) return refuse('not_found', 'There is no such run in this campaign.');
	await plans.lockCells(ctx.db, at.campaignId, [at.profileId], [at.workloadId]);
	const run = await runs.lock(ctx.db, runId);
	if (!run) return refuse('not_found', 'There is no such run in this campaign.');
	return done({
		run,
		cell: {
			campaignId: at.campaignId,
			profileId: at.profileId,
			workloadId: at.workloadId,
			name: `${at.profile}/${at.workload}`
		}
	});
}
