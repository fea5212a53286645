import { and, count, desc, eq, inArray, isNotNull, like, type SQL } from 'drizzle-orm';
import type { Db } from '../client';
import { revision, user } from '../schema';

export type RevisionRow = typeof revision.$inferSelect;

/** One revision of an article with its text and the name of who saved it. */
export const byNumber = async (db: Db, articleId: number, number: number) =>
	(await byNumbers(db, articleId, [number]))[0];

/** Several revisions of an article with their texts, the newest first. */
export const byNumbers = (db: Db, articleId: number, numbers: number[]) =>
	numbers.length === 0
		? Promise.resolve([])
		: db
				.select({
					id: revision.id,
					number: revision.number,
					title: revision.title,
					standfirst: revision.standfirst,
					source: revision.source,
					savedAt: revision.savedAt,
					savedBy: revision.savedBy,
					savedByName: user.name,
					note: revision.note,
					label: revision.label
				})
				.from(revision)
				.innerJoin(user, eq(user.id, revision.savedBy))
				.where(and(eq(revision.articleId, articleId), inArray(revision.number, numbers)))
				.orderBy(desc(revision.number));

export interface RevisionFilter {
	/** Only those with a name. */
	named: boolean;
	/** Words their name holds; empty for any. */
	words: string;
}

const matches = (articleId: number, { named, words }: RevisionFilter): SQL | undefined =>
	and(
		eq(revision.articleId, articleId),
		named ? isNotNull(revision.label) : undefined,
		words === '' ? undefined : like(revision.label, `%${words.replace(/[\\%_]/g, '\\$&')}%`)
	);

/** The revisions of an article without their texts, the newest first. */
export const list = (
	db: Db,
	articleId: number,
	filter: RevisionFilter,
	{ limit, offset }: { limit: number; offset: number }
) =>
	db
		.select({
			number: revision.number,
			title: revision.title,
			savedAt: revision.savedAt,
			savedByName: user.name,
			note: revision.note,
			label: revision.label,
			wordsAdded: revision.wordsAdded,
			wordsRemoved: revision.wordsRemoved
		})
		.from(revision)
		.innerJoin(user, eq(user.id, revision.savedBy))
		.where(matches(articleId, filter))
		.orderBy(desc(revision.number))
		.limit(limit)
		.offset(offset);

export const countOf = async (db: Db, articleId: number, filter: RevisionFilter): Promise<number> =>
	(await db.select({ n: count() }).from(revision).where(matches(articleId, filter)))[0]?.n ?? 0;

export async function setLabel(db: Db, id: number, label: string | null): Promise<void> {
	await db.update(revision).set({ label }).where(eq(revision.id, id));
}

export async function insert(db: Db, row: typeof revision.$inferInsert): Promise<number> {
	const [created] = await db.insert(revision).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the revision.');
	return created.id;
}
