import { and, asc, count, eq, inArray, isNull, ne, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { firmwareMeaning, profile, profileSetting, rig, user } from '../schema';
import { behind, containsWords } from '../search';

export interface MeaningFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	family?: string;
	limit: number;
}

const columns = {
	id: firmwareMeaning.id,
	family: firmwareMeaning.family,
	setting: firmwareMeaning.setting,
	quantity: firmwareMeaning.quantity,
	coreGroup: firmwareMeaning.coreGroup,
	createdBy: user.name,
	createdAt: firmwareMeaning.createdAt,
	version: firmwareMeaning.version
};

/** Every meaning with who wrote it, of one family or of all, by family and setting. */
export const list = (db: Db, family = '') =>
	db
		.select(columns)
		.from(firmwareMeaning)
		.innerJoin(user, eq(user.id, firmwareMeaning.createdBy))
		.where(family === '' ? undefined : eq(firmwareMeaning.family, family))
		.orderBy(asc(firmwareMeaning.family), asc(firmwareMeaning.setting));

/** What settings of several families set, to read profiles by. */
export const ofFamilies = async (db: Db, names: string[]) =>
	names.length === 0
		? []
		: db
				.select({
					family: firmwareMeaning.family,
					setting: firmwareMeaning.setting,
					quantity: firmwareMeaning.quantity,
					coreGroup: firmwareMeaning.coreGroup
				})
				.from(firmwareMeaning)
				.where(inArray(firmwareMeaning.family, names))
				.orderBy(asc(firmwareMeaning.family), asc(firmwareMeaning.setting));

/** Some of the meanings in the order they were written, behind a cursor. */
export const page = (db: Db, { q, after, family, limit }: MeaningFilter) =>
	db
		.select(columns)
		.from(firmwareMeaning)
		.innerJoin(user, eq(user.id, firmwareMeaning.createdBy))
		.where(
			and(
				behind(firmwareMeaning.id, after),
				containsWords(q, [firmwareMeaning.setting, firmwareMeaning.family]),
				family ? eq(firmwareMeaning.family, family) : undefined
			)
		)
		.orderBy(asc(firmwareMeaning.id))
		.limit(limit);

/** One meaning with who wrote it. */
export const whole = async (db: Db, id: number) =>
	(
		await db
			.select(columns)
			.from(firmwareMeaning)
			.innerJoin(user, eq(user.id, firmwareMeaning.createdBy))
			.where(eq(firmwareMeaning.id, id))
	)[0];

export const byId = async (db: Db, id: number) =>
	(await db.select().from(firmwareMeaning).where(eq(firmwareMeaning.id, id)))[0];

/** The families that rigs or meanings name, by name. */
export async function families(db: Db): Promise<string[]> {
	const [ofRigs, ofMeanings] = await Promise.all([
		db.selectDistinct({ family: rig.firmwareFamily }).from(rig).where(ne(rig.firmwareFamily, '')),
		db.selectDistinct({ family: firmwareMeaning.family }).from(firmwareMeaning)
	]);
	return [...new Set([...ofRigs, ...ofMeanings].map((row) => row.family))].sort();
}

/** Settings in profiles that say nothing of what they set and that no line of their rig's family explains. */
export const unexplained = (db: Db, limit: number) =>
	db
		.select({ family: rig.firmwareFamily, setting: profileSetting.setting, n: count() })
		.from(profileSetting)
		.innerJoin(profile, eq(profile.id, profileSetting.profileId))
		.innerJoin(rig, eq(rig.id, profile.rigId))
		.leftJoin(
			firmwareMeaning,
			and(eq(firmwareMeaning.family, rig.firmwareFamily), eq(firmwareMeaning.setting, profileSetting.setting))
		)
		.where(and(eq(profileSetting.quantity, 'other'), ne(rig.firmwareFamily, ''), isNull(firmwareMeaning.id)))
		.groupBy(rig.firmwareFamily, profileSetting.setting)
		.orderBy(asc(rig.firmwareFamily), asc(profileSetting.setting))
		.limit(limit);

export async function insert(db: Db, row: typeof firmwareMeaning.$inferInsert): Promise<number> {
	const [created] = await db.insert(firmwareMeaning).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the meaning.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof firmwareMeaning.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(firmwareMeaning)
		.set({ ...change, version: sql`${firmwareMeaning.version} + 1` })
		.where(and(eq(firmwareMeaning.id, id), eq(firmwareMeaning.version, seen)));
	return result.affectedRows === 1;
}

/** Takes a line out over the version that was seen; what it said stays in the audit log. */
export async function remove(db: Db, id: number, seen: number): Promise<boolean> {
	const [result] = await db
		.delete(firmwareMeaning)
		.where(and(eq(firmwareMeaning.id, id), eq(firmwareMeaning.version, seen)));
	return result.affectedRows === 1;
}
