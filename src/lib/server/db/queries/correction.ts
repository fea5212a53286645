import { desc, eq } from 'drizzle-orm';
import type { Db } from '../client';
import { correction, user } from '../schema';

/** Lists a correction; nothing ever removes one. */
export async function insert(db: Db, row: typeof correction.$inferInsert): Promise<number> {
	const [created] = await db.insert(correction).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the correction.');
	return created.id;
}

/** The corrections of an article, the newest first, with who made them. */
export const ofArticle = (db: Db, articleId: number) =>
	db
		.select({
			id: correction.id,
			kind: correction.kind,
			body: correction.body,
			madeAt: correction.madeAt,
			madeByName: user.name
		})
		.from(correction)
		.innerJoin(user, eq(user.id, correction.madeBy))
		.where(eq(correction.articleId, articleId))
		.orderBy(desc(correction.id));
