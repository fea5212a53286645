import { and, desc, eq, isNull, max } from 'drizzle-orm';
import type { Db } from '../client';
import { edition, editionPart, editionPicture, editionResult, plate, user } from '../schema';

export type NewEdition = Omit<typeof edition.$inferInsert, 'id' | 'number' | 'publishedAt'>;
export type NewPlate = Omit<typeof plate.$inferInsert, 'editionId'>;
export type NewResult = Omit<typeof editionResult.$inferInsert, 'id' | 'editionId'>;

/** Writes an edition with its plates, pictures, results and parts; call it while the article's row is locked. Returns its id and number. */
export async function insert(
	db: Db,
	row: NewEdition,
	parts: { plates: NewPlate[]; pictures: string[]; results: NewResult[]; partIds: number[] }
): Promise<{ id: number; number: number }> {
	const [last] = await db
		.select({ number: max(edition.number) })
		.from(edition)
		.where(eq(edition.articleId, row.articleId));
	const number = (last?.number ?? 0) + 1;
	const [created] = await db
		.insert(edition)
		.values({ ...row, number })
		.$returningId();
	if (!created) throw new Error('The database gave no id for the edition.');
	const editionId = created.id;
	if (parts.plates.length > 0)
		await db.insert(plate).values(parts.plates.map((one) => ({ ...one, editionId })));
	if (parts.pictures.length > 0)
		await db.insert(editionPicture).values(parts.pictures.map((sha256) => ({ editionId, sha256 })));
	if (parts.results.length > 0)
		await db.insert(editionResult).values(parts.results.map((one) => ({ ...one, editionId })));
	if (parts.partIds.length > 0)
		await db.insert(editionPart).values(parts.partIds.map((partId) => ({ editionId, partId })));
	return { id: editionId, number };
}

/** An edition with what it froze. */
export const byId = async (db: Db, id: number) =>
	(await db.select().from(edition).where(eq(edition.id, id)).limit(1))[0];

/** An edition of an article by its number, with what it froze and who approved it. */
export const byNumber = async (db: Db, articleId: number, number: number) =>
	(
		await db
			.select({
				number: edition.number,
				title: edition.title,
				standfirst: edition.standfirst,
				source: edition.source,
				page: edition.page,
				approvedAt: edition.approvedAt,
				approvedByName: user.name
			})
			.from(edition)
			.innerJoin(user, eq(user.id, edition.approvedBy))
			.where(and(eq(edition.articleId, articleId), eq(edition.number, number)))
			.limit(1)
	)[0];

/** The editions of an article without their pages, the newest first. */
export const listOf = (db: Db, articleId: number) =>
	db
		.select({
			id: edition.id,
			number: edition.number,
			title: edition.title,
			hash: edition.hash,
			approvedAt: edition.approvedAt,
			approvedByName: user.name,
			publishedAt: edition.publishedAt
		})
		.from(edition)
		.innerJoin(user, eq(user.id, edition.approvedBy))
		.where(eq(edition.articleId, articleId))
		.orderBy(desc(edition.number));

/** Marks an edition printed; says whether it was not yet. */
export async function markPublished(db: Db, id: number, publishedAt: Date): Promise<boolean> {
	const [result] = await db
		.update(edition)
		.set({ publishedAt })
		.where(and(eq(edition.id, id), isNull(edition.publishedAt)));
	return result.affectedRows === 1;
}
