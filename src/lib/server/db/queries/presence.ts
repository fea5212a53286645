import { and, asc, eq, gt, ne } from 'drizzle-orm';
import type { Db } from '../client';
import { articlePresence, user } from '../schema';

/** Marks a person as there, with their last key. */
export async function mark(db: Db, row: typeof articlePresence.$inferInsert): Promise<void> {
	await db
		.insert(articlePresence)
		.values(row)
		.onDuplicateKeyUpdate({ set: { lastKeyAt: row.lastKeyAt ?? null, seenAt: row.seenAt } });
}

export async function leave(db: Db, articleId: number, personId: string): Promise<void> {
	await db
		.delete(articlePresence)
		.where(and(eq(articlePresence.articleId, articleId), eq(articlePresence.personId, personId)));
}

/** Who else was seen in an article after a moment. */
export const others = (db: Db, articleId: number, personId: string, after: Date) =>
	db
		.select({ name: user.name, lastKeyAt: articlePresence.lastKeyAt })
		.from(articlePresence)
		.innerJoin(user, eq(user.id, articlePresence.personId))
		.where(
			and(
				eq(articlePresence.articleId, articleId),
				ne(articlePresence.personId, personId),
				gt(articlePresence.seenAt, after)
			)
		)
		.orderBy(asc(user.name));
