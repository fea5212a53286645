import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { DropJobInput } from '../../../schemas/people';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as deadJobs from '../../db/queries/dead-jobs';

/** Gives a dead job up for good, with a reason. */
export async function dropJob(
	ctx: Context,
	{ id, reason }: DropJobInput
): Promise<Outcome<null, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'jobs.manage')) return refuse('forbidden', 'Only an admin drops jobs.');
	return inTransaction(ctx.db, async (tx) => {
		if (!(await deadJobs.drop(tx, id, ctx.now))) {
			return refuse('not_found', 'This job was tried again or dropped meanwhile.');
		}
		await audit.append(tx, [
			{ at: ctx.now, actorId: ctx.actor.id, act: 'job.drop', subjectKind: 'job', subjectId: id, reason }
		]);
		return done(null);
	});
}
