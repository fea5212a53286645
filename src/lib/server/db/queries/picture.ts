import { and, eq, inArray, isNull, or } from 'drizzle-orm';
import type { Db } from '../client';
import { article, editionPicture, picture } from '../schema';

export type PictureRow = typeof picture.$inferSelect;
export type NewPicture = typeof picture.$inferInsert;

const facts = {
	sha256: picture.sha256,
	width: picture.width,
	height: picture.height,
	fallback: picture.fallback
};

/** What pages must know of these pictures; one that is not there is left out. */
export const factsOf = (db: Db, hashes: string[]) =>
	hashes.length === 0
		? Promise.resolve([])
		: db.select(facts).from(picture).where(inArray(picture.sha256, hashes));

/** A picture by its hash, or by that of the file it was made from. */
export const byHash = async (db: Db, hash: string): Promise<PictureRow | undefined> =>
	(
		await db
			.select()
			.from(picture)
			.where(or(eq(picture.sha256, hash), eq(picture.uploadSha256, hash)))
			.limit(1)
	)[0];

/** Those of these hashes, of kept files or of files sent, that are here. */
export const byHashes = (db: Db, hashes: string[]): Promise<PictureRow[]> =>
	hashes.length === 0
		? Promise.resolve([])
		: db
				.select()
				.from(picture)
				.where(or(inArray(picture.sha256, hashes), inArray(picture.uploadSha256, hashes)));

export async function insert(db: Db, rows: NewPicture[]): Promise<void> {
	if (rows.length > 0) await db.insert(picture).values(rows);
}

export async function describe(
	db: Db,
	sha256: string,
	words: Partial<Pick<PictureRow, 'alt' | 'credit'>>
): Promise<void> {
	await db.update(picture).set(words).where(eq(picture.sha256, sha256));
}

/** Whether a page that readers have now shows the picture. */
export const isPublished = async (db: Db, sha256: string): Promise<boolean> =>
	(
		await db
			.select({ sha256: editionPicture.sha256 })
			.from(editionPicture)
			.innerJoin(article, eq(article.liveEditionId, editionPicture.editionId))
			.where(and(eq(editionPicture.sha256, sha256), isNull(article.withdrawnAt)))
			.limit(1)
	).length > 0;
