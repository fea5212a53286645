import { and, asc, count, eq, inArray, isNull, lt, lte, min, or, sql } from 'drizzle-orm';
import { inTransaction, type Db } from '../client';
import { job } from '../schema';

export interface ClaimedJob {
	id: number;
	kind: string;
	payload: Record<string, unknown>;
	/** This attempt's number, from 1; with the holder it proves that the lease is still ours. */
	attempts: number;
	maxAttempts: number;
}

const free = (now: Date) => or(isNull(job.leasedUntil), lt(job.leasedUntil, now));

/** Takes up to `limit` due jobs for a holder until `until`; what others hold is passed over, never waited for. */
export const claim = (
	db: Db,
	now: Date,
	holder: { name: string; until: Date; limit: number }
): Promise<ClaimedJob[]> =>
	inTransaction(db, async (tx) => {
		const due = await tx
			.select({
				id: job.id,
				kind: job.kind,
				payload: job.payload,
				attempts: job.attempts,
				maxAttempts: job.maxAttempts
			})
			.from(job)
			.where(and(eq(job.state, 'waiting'), lte(job.runAt, now), free(now)))
			.orderBy(asc(job.runAt), asc(job.id))
			.limit(holder.limit)
			.for('update', { skipLocked: true });
		if (due.length === 0) return [];
		await tx
			.update(job)
			.set({ leasedBy: holder.name, leasedUntil: holder.until, attempts: sql`${job.attempts} + 1` })
			.where(
				inArray(
					job.id,
					due.map((row) => row.id)
				)
			);
		return due.map((row) => ({ ...row, attempts: row.attempts + 1 }));
	});

/** The lease is still the holder's: nobody took the job over meanwhile. */
const held = (claimed: ClaimedJob, holder: string) =>
	and(
		eq(job.id, claimed.id),
		eq(job.state, 'waiting'),
		eq(job.leasedBy, holder),
		eq(job.attempts, claimed.attempts)
	);

export const finish = (db: Db, claimed: ClaimedJob, holder: string, now: Date) =>
	db
		.update(job)
		.set({ state: 'done', finishedAt: now, leasedBy: null, leasedUntil: null, lastError: null })
		.where(held(claimed, holder));

/** Back in the queue for `runAt`, or given up where it is null. */
export const fail = (
	db: Db,
	claimed: ClaimedJob,
	holder: string,
	{ runAt, error, now }: { runAt: Date | null; error: string; now: Date }
) =>
	db
		.update(job)
		.set({
			leasedBy: null,
			leasedUntil: null,
			lastError: error,
			...(runAt ? { runAt } : { state: 'dead' as const, finishedAt: now })
		})
		.where(held(claimed, holder));

/** When the next waiting job comes due; null when none waits. */
export const nextDue = async (db: Db): Promise<Date | null> =>
	(
		await db
			.select({ at: min(job.runAt) })
			.from(job)
			.where(eq(job.state, 'waiting'))
	)[0]?.at ?? null;

export const countDead = async (db: Db): Promise<number> =>
	(await db.select({ n: count() }).from(job).where(eq(job.state, 'dead')))[0]?.n ?? 0;

/** Forgets finished jobs from before a moment; what they did is logged elsewhere. */
export const sweepDone = (db: Db, before: Date) =>
	db.delete(job).where(and(eq(job.state, 'done'), lt(job.finishedAt, before)));
