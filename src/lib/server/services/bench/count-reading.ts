import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ReadingCount } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as readings from '../../db/queries/reading';
import { findOpenCampaign } from './find-campaign';
import { lockRun } from './find-run';
import { takeSignatureOff } from './take-signature-off';

type Way = 'exclude' | 'include';

const already: Record<Way, string> = {
	exclude: 'This reading is excluded already. Nothing was changed.',
	include: 'This reading counts already. Nothing was changed.'
};
const gone = 'There is no such reading in this campaign.';

async function change(
	ctx: Context,
	campaignId: number,
	way: Way,
	input: ReadingCount
): Promise<Outcome<{ signatureRemoved: boolean }>> {
	const runId = await readings.runOf(ctx.db, input.reading);
	if (runId === undefined) return refuse('not_found', gone);
	const locked = await lockRun(ctx, campaignId, runId);
	if (!locked.ok) return refuse('not_found', gone);
	const { run, cell } = locked.value;
	if (run.voidedAt) return refuse('conflict', 'The run of this reading is voided. Nothing was changed.');
	const row = await readings.lock(ctx.db, input.reading);
	if (!row) return refuse('not_found', gone);
	if ((row.excludedAt !== null) === (way === 'exclude')) return refuse('conflict', already[way]);

	const excluded = way === 'exclude';
	await readings.setExclusion(ctx.db, row.id, {
		excludedAt: excluded ? ctx.now : null,
		excludedBy: excluded ? ctx.actor.id : null,
		excludeReason: excluded ? input.reason : null
	});
	const named = { cell: cell.name, run: run.id, reading: row.id, value: row.value };
	await audit.append(ctx.db, [
		{
			at: ctx.now,
			actorId: ctx.actor.id,
			act: `reading.${way}`,
			subjectKind: 'campaign',
			subjectId: cell.campaignId,
			before: { ...named, excluded: !excluded, reason: row.excludeReason },
			after: { ...named, excluded },
			reason: input.reason
		}
	]);
	const words = `Reading ${row.value} was ${excluded ? 'excluded' : 'taken back'}: ${input.reason}`;
	return done({ signatureRemoved: await takeSignatureOff(ctx, cell, words) });
}

async function count(ctx: Context, campaignRef: string, way: Way, input: ReadingCount) {
	if (!may(ctx.actor, 'reading.exclude'))
		return refuse('forbidden', 'Only a tester decides which readings count.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	return inTransaction(ctx.db, (db) => change({ ...ctx, db }, found.value.head.id, way, input));
}

/** Takes a reading out of the figures, with a reason; it stays on record. */
export const excludeReading = (ctx: Context, campaignRef: string, input: ReadingCount) =>
	count(ctx, campaignRef, 'exclude', input);

/** Lets an excluded reading count again, with a reason. */
export const includeReading = (ctx: Context, campaignRef: string, input: ReadingCount) =>
	count(ctx, campaignRef, 'include', input);
