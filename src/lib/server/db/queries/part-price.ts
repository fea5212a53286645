import { desc, eq, inArray, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { partPrice } from '../schema';

/** The latest price of each part: the last seen, and of those of one day the last written. */
export async function latestOf(db: Db, partIds: number[]) {
	if (partIds.length === 0) return [];
	const ranked = db
		.select({
			partId: partPrice.partId,
			amountMinor: partPrice.amountMinor,
			currency: partPrice.currency,
			observedOn: partPrice.observedOn,
			source: partPrice.source,
			rank: sql<number>`row_number() over (partition by ${partPrice.partId} order by ${partPrice.observedOn} desc, ${partPrice.id} desc)`.as(
				'price_rank'
			)
		})
		.from(partPrice)
		.where(inArray(partPrice.partId, partIds))
		.as('ranked');
	return db
		.select({
			partId: ranked.partId,
			amountMinor: ranked.amountMinor,
			currency: ranked.currency,
			observedOn: ranked.observedOn,
			source: ranked.source
		})
		.from(ranked)
		.where(eq(ranked.rank, 1));
}

/** All prices seen of several parts, newest first. */
export const ofParts = async (db: Db, partIds: number[]) =>
	partIds.length === 0
		? []
		: db
				.select()
				.from(partPrice)
				.where(inArray(partPrice.partId, partIds))
				.orderBy(desc(partPrice.observedOn), desc(partPrice.id));

export async function insert(db: Db, rows: (typeof partPrice.$inferInsert)[]): Promise<void> {
	if (rows.length > 0) await db.insert(partPrice).values(rows);
}

/** The currency of the price written last; undefined before the first. */
export const lastCurrency = async (db: Db) =>
	(await db.select({ currency: partPrice.currency }).from(partPrice).orderBy(desc(partPrice.id)).limit(1))[0]
		?.currency;
