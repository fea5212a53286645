import type { ArticleData } from '../../../domain/articles/data';
import { picturesIn } from '../../../domain/articles/pictures/picture';
import type { Db } from '../../db/client';
import * as pictures from '../../db/queries/picture';

/** The data of an article with what is known of the pictures its text names, and which of them are not there. */
export async function withPictures(db: Db, data: ArticleData, source: string): Promise<ArticleData> {
	const named = picturesIn(source);
	if (named.length === 0) return data;
	const known = await pictures.factsOf(db, named);
	const there = new Set(known.map((one) => one.sha256));
	// In the order of the text, so that the same text freezes to the same data.
	const ordered = named.flatMap((hash) => known.find((one) => one.sha256 === hash) ?? []);
	const missingPictures = named.filter((hash) => !there.has(hash));
	return { ...data, pictures: ordered, ...(missingPictures.length > 0 ? { missingPictures } : {}) };
}
