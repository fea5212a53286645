import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as deadJobs from '../../db/queries/dead-jobs';

/** Puts a dead job back in the queue, to be tried at once. */
export async function retryJob(ctx: Context, id: number): Promise<Outcome<null, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'jobs.manage')) return refuse('forbidden', 'Only an admin tries jobs again.');
	return inTransaction(ctx.db, async (tx) => {
		if (!(await deadJobs.revive(tx, id, ctx.now))) {
			return refuse('not_found', 'This job was tried again or dropped meanwhile.');
		}
		await audit.append(tx, [
			{ at: ctx.now, actorId: ctx.actor.id, act: 'job.retry', subjectKind: 'job', subjectId: id }
		]);
		return done(null);
	});
}
