import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as deadJobs from '../../db/queries/dead-jobs';
import * as mails from '../../db/queries/mail-heads';

const jobsPerPage = 50;

async function pageOf({ db }: Context, page: number) {
	const { rows, total } = await deadJobs.list(db, { limit: jobsPerPage, offset: (page - 1) * jobsPerPage });
	const mailIds = rows.map((row) => row.payload.mailId).filter((id) => typeof id === 'number');
	const heads = new Map((await mails.headsOf(db, mailIds)).map((mail) => [mail.id, mail]));
	return {
		jobs: rows.map((row) => ({ ...row, mail: heads.get(Number(row.payload.mailId)) ?? null })),
		total,
		page,
		pages: Math.max(1, Math.ceil(total / jobsPerPage))
	};
}

/** Jobs that were tried as often as they may be; a mail among them with whom it is for. */
export async function listDeadJobs(
	ctx: Context,
	page: number
): Promise<Outcome<Awaited<ReturnType<typeof pageOf>>, 'forbidden'>> {
	if (!may(ctx.actor, 'jobs.manage')) return refuse('forbidden', 'Only an admin sees the jobs.');
	return done(await pageOf(ctx, page));
}
