import { and, eq, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { setting } from '../schema';

/** What the publication calls itself and which clock it lives by. */
export interface Publication {
	name: string;
	/** IANA zone, such as Europe/Oslo. */
	zone: string;
	tagline: string;
	isDemo: boolean;
	/** 0 while nothing was saved yet. */
	version: number;
}

const unnamed: Publication = {
	name: 'Calipress',
	zone: 'UTC',
	tagline: 'Measure, then print.',
	isDemo: false,
	version: 0
};

/** The publication's settings, with plain ones before the first save. */
export async function publication(db: Db): Promise<Publication> {
	const [row] = await db.select().from(setting).where(eq(setting.key, 'publication'));
	if (!row) return unnamed;
	return { ...unnamed, ...(row.value as Partial<Publication>), isDemo: row.isDemo, version: row.version };
}

/** Saves the publication's settings over the version that was seen; says whether they were. */
export async function savePublication(
	db: Db,
	value: Pick<Publication, 'name' | 'zone' | 'tagline'>,
	seen: number
): Promise<boolean> {
	if (seen === 0) {
		const [made] = await db.insert(setting).ignore().values({ key: 'publication', value });
		return made.affectedRows === 1;
	}
	const [changed] = await db
		.update(setting)
		.set({ value, version: sql`${setting.version} + 1` })
		.where(and(eq(setting.key, 'publication'), eq(setting.version, seen)));
	return changed.affectedRows === 1;
}
