import { and, eq, inArray, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { cellSignature } from '../schema';

export interface Cell {
	campaignId: number;
	profileId: number;
	workloadId: number;
}

/** Standing signatures of some cells, as they are now, locked until the transaction ends; other cells stay free. */
export const standingOf = (db: Db, cells: readonly Cell[]) =>
	db
		.select({
			id: cellSignature.id,
			profileId: cellSignature.profileId,
			workloadId: cellSignature.workloadId
		})
		.from(cellSignature)
		.where(
			inArray(
				cellSignature.standing,
				cells.map((cell) => `${cell.campaignId}/${cell.profileId}/${cell.workloadId}`)
			)
		)
		.for('update');

/** Standing signatures of a campaign, as they are now, locked until the transaction ends. */
export const standing = (db: Db, campaignId: number) =>
	db
		.select({
			id: cellSignature.id,
			profileId: cellSignature.profileId,
			workloadId: cellSignature.workloadId,
			signedBy: cellSignature.signedBy,
			signedAt: cellSignature.signedAt
		})
		.from(cellSignature)
		.where(and(eq(cellSignature.campaignId, campaignId), isNull(cellSignature.removedAt)))
		.for('update');

export async function insertMany(db: Db, rows: (typeof cellSignature.$inferInsert)[]): Promise<void> {
	if (rows.length > 0) await db.insert(cellSignature).values(rows);
}

/** Takes signatures off, with the reason. */
export async function takeOff(db: Db, ids: number[], removedAt: Date, removedReason: string): Promise<void> {
	if (ids.length > 0)
		await db.update(cellSignature).set({ removedAt, removedReason }).where(inArray(cellSignature.id, ids));
}
