import { and, asc, eq, isNull } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Db } from '../client';
import { comment, user } from '../schema';

const resolver = alias(user, 'resolver');

/** Every comment of an article, the oldest first, with the names of who wrote and who resolved it. */
export const ofArticle = (db: Db, articleId: number) =>
	db
		.select({
			id: comment.id,
			parentId: comment.parentId,
			revisionNumber: comment.revisionNumber,
			quote: comment.quote,
			body: comment.body,
			blocking: comment.blocking,
			authorId: comment.authorId,
			authorName: user.name,
			createdAt: comment.createdAt,
			resolvedAt: comment.resolvedAt,
			resolvedByName: resolver.name
		})
		.from(comment)
		.innerJoin(user, eq(user.id, comment.authorId))
		.leftJoin(resolver, eq(resolver.id, comment.resolvedBy))
		.where(eq(comment.articleId, articleId))
		.orderBy(asc(comment.id));

export const byId = async (db: Db, articleId: number, id: number) =>
	(
		await db
			.select()
			.from(comment)
			.where(and(eq(comment.articleId, articleId), eq(comment.id, id)))
			.for('update')
	)[0];

export async function insert(db: Db, row: typeof comment.$inferInsert): Promise<number> {
	const [created] = await db.insert(comment).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the comment.');
	return created.id;
}

/** Marks a comment resolved, or open again with nulls. */
export const setResolved = (
	db: Db,
	id: number,
	change: { resolvedAt: Date; resolvedBy: string } | { resolvedAt: null; resolvedBy: null }
) => db.update(comment).set(change).where(eq(comment.id, id));

/** Blocking comments of an article that nobody has resolved. */
export const blockingOf = (db: Db, articleId: number) =>
	db
		.select({ id: comment.id, quote: comment.quote, body: comment.body, authorName: user.name })
		.from(comment)
		.innerJoin(user, eq(user.id, comment.authorId))
		.where(
			and(
				eq(comment.articleId, articleId),
				eq(comment.blocking, true),
				isNull(comment.resolvedAt),
				isNull(comment.parentId)
			)
		)
		.orderBy(asc(comment.id));
