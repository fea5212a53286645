import { inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { part } from '../schema';

/** The ids of parts by their slugs; slugs that are no part's are left out. */
export const ofSlugs = async (db: Db, slugs: string[]): Promise<number[]> =>
	slugs.length === 0
		? []
		: (await db.select({ id: part.id }).from(part).where(inArray(part.slug, slugs))).map((row) => row.id);
