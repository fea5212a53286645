import { and, desc, eq, notInArray, sql } from 'drizzle-orm';
import type { Db } from '../db/client';
import { job, mail } from '../db/schema';

/** Mails that a fresh demo still has to send, so that its inbox has something in it. */
const waiting = 5;

/**
 * Marks all letters of the demo but the newest as sent at the time they were written, and their jobs as done:
 * starting it does not send the mail of ten weeks.
 */
export async function settleLetters(db: Db): Promise<void> {
	const newest = await db
		.select({ id: mail.id, messageId: mail.messageId })
		.from(mail)
		.orderBy(desc(mail.createdAt), desc(mail.id))
		.limit(waiting);
	if (newest.length === 0) return;
	await db
		.update(mail)
		.set({ sentAt: sql`${mail.createdAt}` })
		.where(
			notInArray(
				mail.id,
				newest.map((row) => row.id)
			)
		);
	await db
		.update(job)
		.set({ state: 'done', attempts: 1, finishedAt: sql`${job.createdAt}` })
		.where(
			and(
				eq(job.kind, 'send-mail'),
				notInArray(
					job.dedupeKey,
					newest.map((row) => `send-mail:${row.messageId}`)
				)
			)
		);
}
