import { and, count, desc, eq } from 'drizzle-orm';
import type { Db } from '../client';
import { job } from '../schema';

const isDead = eq(job.state, 'dead');

/** One page of the jobs that were given up, newest first, with all of them counted. */
export async function list(db: Db, page: { limit: number; offset: number }) {
	const [rows, [total]] = await Promise.all([
		db
			.select({
				id: job.id,
				kind: job.kind,
				payload: job.payload,
				attempts: job.attempts,
				lastError: job.lastError,
				createdAt: job.createdAt,
				finishedAt: job.finishedAt
			})
			.from(job)
			.where(isDead)
			.orderBy(desc(job.id))
			.limit(page.limit)
			.offset(page.offset),
		db.select({ n: count() }).from(job).where(isDead)
	]);
	return { rows, total: total?.n ?? 0 };
}

/** Puts a dead job back in the queue, with all its attempts; says whether it was there and dead. */
export async function revive(db: Db, id: number, runAt: Date): Promise<boolean> {
	const [changed] = await db
		.update(job)
		.set({ state: 'waiting', runAt, attempts: 0, leasedUntil: null, leasedBy: null, finishedAt: null })
		.where(and(eq(job.id, id), isDead));
	return changed.affectedRows === 1;
}

/** Gives a dead job up for good; says whether it was there and dead. */
export async function drop(db: Db, id: number, now: Date): Promise<boolean> {
	const [changed] = await db
		.update(job)
		.set({ state: 'dropped', finishedAt: now })
		.where(and(eq(job.id, id), isDead));
	return changed.affectedRows === 1;
}
