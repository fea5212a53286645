import * as mails from '../db/queries/mail';
import type { JobHandler } from './handler';

/** Sends one mail of the outbox; what was sent stays sent, however often the job comes back. */
export const sendMail: JobHandler = async (ctx, { mailId }, tools) => {
	const mail = await mails.byId(ctx.db, Number(mailId));
	if (!mail) throw new Error(`The outbox has no mail ${String(mailId)}.`);
	if (mail.sentAt) return;
	await tools.deliver(mail);
	await mails.markSent(ctx.db, mail.id, ctx.now);
};
