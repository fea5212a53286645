import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { attempt, ladderStress, user, workload } from '../schema';

/** Every attempt of ladders, voided ones too, the newest first. */
export const ofLadders = async (db: Db, ladderIds: number[]) =>
	ladderIds.length === 0
		? []
		: db
				.select({
					id: attempt.id,
					ladderId: attempt.ladderId,
					stress: workload.slug,
					stressName: workload.name,
					stressKind: ladderStress.kind,
					clockMHz: attempt.clockMhz,
					volts: attempt.volts,
					durationMin: attempt.durationMin,
					outcome: attempt.outcome,
					failure: attempt.failure,
					errors: attempt.errors,
					peakTempC: attempt.peakTempC,
					packageW: attempt.packageW,
					ambientC: attempt.ambientC,
					notes: attempt.notes,
					tester: user.name,
					startedAt: attempt.startedAt,
					voidedAt: attempt.voidedAt,
					voidReason: attempt.voidReason
				})
				.from(attempt)
				.innerJoin(
					ladderStress,
					and(eq(ladderStress.ladderId, attempt.ladderId), eq(ladderStress.workloadId, attempt.workloadId))
				)
				.innerJoin(workload, eq(workload.id, attempt.workloadId))
				.innerJoin(user, eq(user.id, attempt.testerId))
				.where(inArray(attempt.ladderId, ladderIds))
				.orderBy(desc(attempt.startedAt), desc(attempt.id));

export type AttemptRow = Awaited<ReturnType<typeof ofLadders>>[number];

/** Attempts that a tester's client sent under these keys. */
export const byKeys = async (db: Db, testerId: string, keys: string[]) =>
	keys.length === 0
		? []
		: db
				.select({ id: attempt.id, ladderId: attempt.ladderId, clientKey: attempt.clientKey })
				.from(attempt)
				.where(and(eq(attempt.testerId, testerId), inArray(attempt.clientKey, keys)))
				.orderBy(asc(attempt.id));

export async function insertMany(db: Db, rows: (typeof attempt.$inferInsert)[]): Promise<number[]> {
	const ids: number[] = [];
	// One by one: a cluster does not count in steps of one, so that the ids of several cannot be told.
	for (const row of rows) {
		const [created] = await db.insert(attempt).values(row).$returningId();
		if (!created) throw new Error('The database gave no id for the attempt.');
		ids.push(created.id);
	}
	return ids;
}

/** An attempt of a ladder, locked until the transaction ends. */
export const lock = async (db: Db, ladderId: number, id: number) =>
	(
		await db
			.select()
			.from(attempt)
			.where(and(eq(attempt.id, id), eq(attempt.ladderId, ladderId)))
			.for('update')
	)[0];

export const markVoid = (
	db: Db,
	id: number,
	change: { voidedAt: Date; voidedBy: string; voidReason: string }
) => db.update(attempt).set(change).where(eq(attempt.id, id));
