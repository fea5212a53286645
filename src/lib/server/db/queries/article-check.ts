import { and, eq } from 'drizzle-orm';
import type { ChecklistGroup } from '../../../domain/articles/template';
import type { Db } from '../client';
import { articleCheck, user } from '../schema';

/** What is ticked off on an article, with by whom and when. */
export const ofArticle = (db: Db, articleId: number) =>
	db
		.select({
			group: articleCheck.group,
			item: articleCheck.item,
			checkedBy: user.name,
			checkedAt: articleCheck.checkedAt
		})
		.from(articleCheck)
		.innerJoin(user, eq(user.id, articleCheck.checkedBy))
		.where(eq(articleCheck.articleId, articleId));

export const insert = (db: Db, row: typeof articleCheck.$inferInsert) => db.insert(articleCheck).values(row);

/** Takes a tick back; false where there was none. */
export async function remove(
	db: Db,
	articleId: number,
	group: ChecklistGroup,
	item: string
): Promise<boolean> {
	const [result] = await db
		.delete(articleCheck)
		.where(
			and(eq(articleCheck.articleId, articleId), eq(articleCheck.group, group), eq(articleCheck.item, item))
		);
	return result.affectedRows > 0;
}
