import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RunEdit } from '../../../schemas/run';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as runs from '../../db/queries/run';
import * as settings from '../../db/queries/settings';
import { findOpenCampaign } from './find-campaign';
import { lockRun, type LockedRun } from './find-run';
import { readAmbient, readStarted } from './read-started';

type Circumstances = Pick<LockedRun, 'ambientC' | 'startedAt' | 'notes'>;

const of = ({ ambientC, startedAt, notes }: Circumstances): Circumstances => ({ ambientC, startedAt, notes });

/** Whether a field that knows no milliseconds still says the time it was filled with. */
const sameSecond = (typed: Date, stored: Date): boolean =>
	Math.trunc(typed.getTime() / 1000) === Math.trunc(stored.getTime() / 1000);

/** Corrects what stands beside a run's readings: when it began, how warm it was, notes. The readings stay as they are. */
export async function editRun(ctx: Context, campaignRef: string, input: RunEdit): Promise<Outcome<null>> {
	if (!may(ctx.actor, 'run.record')) return refuse('forbidden', 'Only a tester corrects runs.');
	const found = await findOpenCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { zone } = await settings.publication(ctx.db);
	const startedAt = readStarted(input.started, zone);
	if (!startedAt.ok) return startedAt;
	const ambientC = readAmbient(input.ambient);
	if (!ambientC.ok) return ambientC;
	return inTransaction(ctx.db, async (db) => {
		const locked = await lockRun({ ...ctx, db }, found.value.head.id, input.run);
		if (!locked.ok) return locked;
		const { run, cell } = locked.value;
		const after = {
			ambientC: ambientC.value,
			startedAt:
				startedAt.value && !sameSecond(startedAt.value, run.startedAt) ? startedAt.value : run.startedAt,
			notes: input.notes
		};
		if (!(await runs.update(db, run.id, input.version, after)))
			return refuse(
				'conflict',
				'Somebody else corrected this run meanwhile. Nothing was changed; what you typed is still here.'
			);
		await audit.append(db, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'run.edit',
				subjectKind: 'campaign',
				subjectId: cell.campaignId,
				before: { cell: cell.name, run: run.id, ...of(run) },
				after: { cell: cell.name, run: run.id, ...after }
			}
		]);
		return done(null);
	});
}
