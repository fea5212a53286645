import { and, asc, eq, inArray, max } from 'drizzle-orm';
import type { Db } from '../client';
import { sweepPass, sweepPoint, user } from '../schema';

/** Every pass of sweeps, voided ones too, by number. */
export const ofSweeps = async (db: Db, sweepIds: number[]) =>
	sweepIds.length === 0
		? []
		: db
				.select({
					id: sweepPass.id,
					sweepId: sweepPass.sweepId,
					number: sweepPass.number,
					tester: user.name,
					startedAt: sweepPass.startedAt,
					ambientC: sweepPass.ambientC,
					notes: sweepPass.notes,
					voidedAt: sweepPass.voidedAt,
					voidReason: sweepPass.voidReason
				})
				.from(sweepPass)
				.innerJoin(user, eq(user.id, sweepPass.testerId))
				.where(inArray(sweepPass.sweepId, sweepIds))
				.orderBy(asc(sweepPass.sweepId), asc(sweepPass.number));

export type PassRow = Awaited<ReturnType<typeof ofSweeps>>[number];

/** The points of passes, each in the order it was driven. */
export const pointsOf = async (db: Db, passIds: number[]) =>
	passIds.length === 0
		? []
		: db
				.select({
					passId: sweepPoint.passId,
					threads: sweepPoint.threads,
					currentA: sweepPoint.currentA,
					clockMHz: sweepPoint.clockMhz
				})
				.from(sweepPoint)
				.where(inArray(sweepPoint.passId, passIds))
				.orderBy(asc(sweepPoint.passId), asc(sweepPoint.position));

/** The pass that a tester's client sent under a key. */
export const byKey = async (db: Db, testerId: string, clientKey: string) =>
	(
		await db
			.select({ id: sweepPass.id, sweepId: sweepPass.sweepId, number: sweepPass.number })
			.from(sweepPass)
			.where(and(eq(sweepPass.testerId, testerId), eq(sweepPass.clientKey, clientKey)))
	)[0];

/** The number of the next pass; the caller holds the sweep's lock. */
export const nextNumber = async (db: Db, sweepId: number) =>
	((
		await db
			.select({ last: max(sweepPass.number) })
			.from(sweepPass)
			.where(eq(sweepPass.sweepId, sweepId))
	)[0]?.last ?? 0) + 1;

export async function insert(
	db: Db,
	row: typeof sweepPass.$inferInsert,
	points: Omit<typeof sweepPoint.$inferInsert, 'passId' | 'position'>[]
): Promise<number> {
	const [created] = await db.insert(sweepPass).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the pass.');
	await db
		.insert(sweepPoint)
		.values(points.map((point, at) => ({ ...point, passId: created.id, position: at + 1 })));
	return created.id;
}

/** A pass of a sweep, locked until the transaction ends. */
export const lock = async (db: Db, sweepId: number, id: number) =>
	(
		await db
			.select()
			.from(sweepPass)
			.where(and(eq(sweepPass.id, id), eq(sweepPass.sweepId, sweepId)))
			.for('update')
	)[0];

export const markVoid = (
	db: Db,
	id: number,
	change: { voidedAt: Date; voidedBy: string; voidReason: string }
) => db.update(sweepPass).set(change).where(eq(sweepPass.id, id));
