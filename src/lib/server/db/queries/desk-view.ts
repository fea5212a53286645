import { and, asc, eq, or } from 'drizzle-orm';
import type { Db } from '../client';
import { deskView, user } from '../schema';

/** The views somebody sees: their own, and those that others share. */
export const list = (db: Db, personId: string) =>
	db
		.select({
			id: deskView.id,
			name: deskView.name,
			query: deskView.query,
			shared: deskView.shared,
			ownerId: deskView.ownerId,
			ownerName: user.name
		})
		.from(deskView)
		.innerJoin(user, eq(user.id, deskView.ownerId))
		.where(or(eq(deskView.ownerId, personId), eq(deskView.shared, true)))
		.orderBy(asc(deskView.name), asc(deskView.id));

/** Keeps a view; one of the same person and name is replaced. */
export const put = (db: Db, row: typeof deskView.$inferInsert) =>
	db
		.insert(deskView)
		.values(row)
		.onDuplicateKeyUpdate({ set: { query: row.query, shared: row.shared } });

/** Forgets a view of somebody's own; says whether there was one. */
export async function remove(db: Db, id: number, ownerId: string): Promise<boolean> {
	const [result] = await db.delete(deskView).where(and(eq(deskView.id, id), eq(deskView.ownerId, ownerId)));
	return result.affectedRows === 1;
}
