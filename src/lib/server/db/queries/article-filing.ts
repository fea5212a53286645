import { and, eq, inArray, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { article, articleHandOver, articleTag, articleText } from '../schema';

/** Keeps the newest text of an article for the search. */
export const putText = (db: Db, row: typeof articleText.$inferInsert) =>
	db
		.insert(articleText)
		.values(row)
		.onDuplicateKeyUpdate({ set: { title: row.title, standfirst: row.standfirst, source: row.source } });

/** Takes several articles for this transaction alone, in one order for everybody. */
export const lockBySlugs = (db: Db, slugs: string[]) =>
	db.select().from(article).where(inArray(article.slug, slugs)).orderBy(article.id).for('update');

/** Files articles under a tag; those that carry it already keep it. */
export const addTag = (db: Db, articleIds: number[], tag: string) =>
	db
		.insert(articleTag)
		.values(articleIds.map((articleId) => ({ articleId, tag })))
		.onDuplicateKeyUpdate({ set: { tag: sql`${articleTag.tag}` } });

export const removeTag = (db: Db, articleIds: number[], tag: string) =>
	db.delete(articleTag).where(and(inArray(articleTag.articleId, articleIds), eq(articleTag.tag, tag)));

/** Which of the articles carry a tag. */
export const withTag = async (db: Db, articleIds: number[], tag: string): Promise<Set<number>> =>
	new Set(
		(
			await db
				.select({ id: articleTag.articleId })
				.from(articleTag)
				.where(and(inArray(articleTag.articleId, articleIds), eq(articleTag.tag, tag)))
		).map((row) => row.id)
	);

/** Gives locked articles another author. */
export async function giveTo(
	db: Db,
	rows: { id: number; authorId: string }[],
	to: string,
	by: string,
	at: Date
): Promise<void> {
	await db
		.update(article)
		.set({ authorId: to, updatedAt: at, version: sql`${article.version} + 1` })
		.where(
			inArray(
				article.id,
				rows.map((row) => row.id)
			)
		);
	await db
		.insert(articleHandOver)
		.values(
			rows.map((row) => ({ articleId: row.id, fromId: row.authorId, toId: to, madeBy: by, madeAt: at }))
		);
}

/** Whether somebody was the author of an article before. */
export const wasAuthor = async (db: Db, articleId: number, personId: string): Promise<boolean> =>
	(
		await db
			.select({ id: articleHandOver.id })
			.from(articleHandOver)
			.where(and(eq(articleHandOver.articleId, articleId), eq(articleHandOver.fromId, personId)))
			.limit(1)
	).length > 0;
