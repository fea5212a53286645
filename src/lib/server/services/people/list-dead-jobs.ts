import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize } from '../../../schemas/listing';
import type { Context } from '../../context';
import * as deadJobs from '../../db/queries/dead-jobs';
import * as mails from '../../db/queries/mail-heads';

async function pageOf({ db }: Context, page: number) {
	const { rows, total } = await deadJobs.list(db, { limit: pageSize, offset: (page - 1) * pageSize });
	const mailIds = rows.map((row) => row.payload.mailId).filter((id) => typeof id === 'number');
	const heads = new Map((await mails.headsOf(db, mailIds)).map((mail) => [mail.id, mail]));
	return paged(
		rows.map((row) => ({ ...row, mail: heads.get(Number(row.payload.mailId)) ?? null })),
		total,
		page
	);
}

/** Jobs that were tried as often as they may be; a mail among them with whom it is for. */
export async function listDeadJobs(
	ctx: Context,
	page: number
): Promise<Outcome<Awaited<ReturnType<typeof pageOf>>, 'forbidden'>> {
	if (!may(ctx.actor, 'jobs.manage')) return refuse('forbidden', 'Only an admin sees the jobs.');
	return done(await pageOf(ctx, page));
}
