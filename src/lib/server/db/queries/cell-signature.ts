import { and, eq, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { cellSignature } from '../schema';

export interface Cell {
	campaignId: number;
	profileId: number;
	workloadId: number;
}

/** Standing signatures of a campaign. */
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
		.where(and(eq(cellSignature.campaignId, campaignId), isNull(cellSignature.removedAt)));

export async function insertMany(db: Db, rows: (typeof cellSignature.$inferInsert)[]): Promise<void> {
	if (rows.length > 0) await db.insert(cellSignature).values(rows);
}

/** Takes the standing signature off a cell; false where there was none. */
export async function takeOff(db: Db, cell: Cell, removedAt: Date, removedReason: string): Promise<boolean> {
	const [result] = await db
		.update(cellSignature)
		.set({ removedAt, removedReason })
		.where(
			and(
				eq(cellSignature.campaignId, cell.campaignId),
				eq(cellSignature.profileId, cell.profileId),
				eq(cellSignature.workloadId, cell.workloadId),
				isNull(cellSignature.removedAt)
			)
		);
	return result.affectedRows > 0;
}
