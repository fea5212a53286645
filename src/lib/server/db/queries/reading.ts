import { and, asc, count, eq, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { reading, run } from '../schema';

/** Several readings at once, in slices that stay far below the server's packet limit. */
export async function insertMany(db: Db, rows: (typeof reading.$inferInsert)[]): Promise<void> {
	const slice = 2000;
	for (let from = 0; from < rows.length; from += slice) {
		await db.insert(reading).values(rows.slice(from, from + slice));
	}
}

/**
 * The readings of a run in the order they were taken. The lock of its cell keeps others from it: a lock of their own
 * would reach beyond the newest run and hold up whoever begins the next one.
 */
export const ofRun = (db: Db, runId: number) =>
	db.select().from(reading).where(eq(reading.runId, runId)).orderBy(asc(reading.position));

/** Which run a reading is in, without a lock; its cell is locked first. */
export const runOf = async (db: Db, id: number) =>
	(await db.select({ runId: reading.runId }).from(reading).where(eq(reading.id, id)).limit(1))[0]?.runId;

/** The reading row, locked until the transaction ends. */
export const lock = async (db: Db, id: number) =>
	(await db.select().from(reading).where(eq(reading.id, id)).for('update'))[0];

export const setExclusion = (
	db: Db,
	id: number,
	change: { excludedAt: Date | null; excludedBy: string | null; excludeReason: string | null }
) => db.update(reading).set(change).where(eq(reading.id, id));

/**
 * The readings of one cell that count, in the order they were recorded, for a transaction that locked the cell before
 * it read anything: its view begins after everybody else's writing in the cell.
 */
export const countedOfCell = (db: Db, cell: { campaignId: number; profileId: number; workloadId: number }) =>
	db
		.select({ id: reading.id, value: reading.value, runId: reading.runId, createdAt: reading.createdAt })
		.from(run)
		.innerJoin(reading, and(eq(reading.runId, run.id), isNull(reading.excludedAt)))
		.where(
			and(
				eq(run.campaignId, cell.campaignId),
				eq(run.profileId, cell.profileId),
				eq(run.workloadId, cell.workloadId),
				isNull(run.voidedAt)
			)
		)
		.orderBy(asc(run.id), asc(reading.position));

/** As countedOfCell, as they stand now, whatever the transaction read before it locked the cell. */
export const countedOfCellNow = (
	db: Db,
	cell: { campaignId: number; profileId: number; workloadId: number }
) => countedOfCell(db, cell).for('update');

/** How many readings of each cell of a campaign count. */
export const countsOfCells = (db: Db, campaignId: number) =>
	db
		.select({ profileId: run.profileId, workloadId: run.workloadId, readings: count() })
		.from(run)
		.innerJoin(reading, and(eq(reading.runId, run.id), isNull(reading.excludedAt)))
		.where(and(eq(run.campaignId, campaignId), isNull(run.voidedAt)))
		.groupBy(run.profileId, run.workloadId);

/** The values of one cell that count, without a lock: what a new one is held against. */
export const valuesOfCell = async (
	db: Db,
	cell: { campaignId: number; profileId: number; workloadId: number }
): Promise<number[]> =>
	(
		await db
			.select({ value: reading.value })
			.from(run)
			.innerJoin(reading, and(eq(reading.runId, run.id), isNull(reading.excludedAt)))
			.where(
				and(
					eq(run.campaignId, cell.campaignId),
					eq(run.profileId, cell.profileId),
					eq(run.workloadId, cell.workloadId),
					isNull(run.voidedAt)
				)
			)
	).map((row) => row.value);
