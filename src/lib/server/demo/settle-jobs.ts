import { and, desc, eq, lte, notInArray, sql } from 'drizzle-orm';
import type { Db } from '../db/client';
import { job, mail } from '../db/schema';

/** Mails that a fresh demo still has to send, so that its inbox has something in it. */
const waiting = 5;

const finished = { state: 'done', attempts: 1, finishedAt: sql`${job.runAt}` } as const;

/**
 * Marks all letters of the demo but the newest as sent at the time they were written, and the jobs of what lies
 * behind as done: starting it does not send the mail of ten weeks.
 */
export async function settleJobs(db: Db, now: Date): Promise<void> {
	const newest = await db
		.select({ id: mail.id, messageId: mail.messageId })
		.from(mail)
		.orderBy(desc(mail.createdAt), desc(mail.id))
		.limit(waiting);
	const ids = newest.map((row) => row.id);
	const keys = newest.map((row) => `send-mail:${row.messageId}`);
	await db
		.update(mail)
		.set({ sentAt: sql`${mail.createdAt}` })
		.where(notInArray(mail.id, ids));
	await db
		.update(job)
		.set(finished)
		.where(and(eq(job.kind, 'send-mail'), notInArray(job.dedupeKey, keys)));
	await db
		.update(job)
		.set(finished)
		.where(and(eq(job.kind, 'publish-article'), lte(job.runAt, now)));
}
