import { and, asc, eq, inArray, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, campaignProfile, profile, profileSetting, rig, run } from '../schema';
import { behind, containsWords, idsAmong } from '../search';

export interface ProfileFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	rigIds?: number[];
}

const matching = ({ q, rigIds, after }: ProfileFilter) =>
	and(
		behind(profile.id, after),
		containsWords(q, [profile.name, profile.slug, rig.name]),
		rigIds === undefined ? undefined : rigIds.length ? inArray(profile.rigId, rigIds) : sql`false`
	);

const columns = {
	id: profile.id,
	rigId: profile.rigId,
	rigSlug: rig.slug,
	rigName: rig.name,
	slug: profile.slug,
	name: profile.name,
	parentId: profile.parentId,
	notes: profile.notes,
	createdAt: profile.createdAt,
	version: profile.version
};

/** Profiles in the order they were written. */
export const list = (db: Db, filter: ProfileFilter & { limit: number }) =>
	db
		.select(columns)
		.from(profile)
		.innerJoin(rig, eq(rig.id, profile.rigId))
		.where(matching(filter))
		.orderBy(asc(profile.id))
		.limit(filter.limit);

/** Every profile of several rigs, the oldest first, so that a parent comes before its children. */
export const ofRigs = async (db: Db, rigIds: number[]) =>
	rigIds.length === 0
		? []
		: db
				.select(columns)
				.from(profile)
				.innerJoin(rig, eq(rig.id, profile.rigId))
				.where(inArray(profile.rigId, rigIds))
				.orderBy(asc(profile.id));

/** Profiles of one rig by slug or id, in no order. */
export const byRefs = async (db: Db, rigId: number, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select(columns)
				.from(profile)
				.innerJoin(rig, eq(rig.id, profile.rigId))
				.where(
					and(
						eq(profile.rigId, rigId),
						or(inArray(profile.slug, refs), ids.length ? inArray(profile.id, ids) : undefined)
					)
				);
};

export const byIds = async (db: Db, ids: number[]) =>
	ids.length === 0
		? []
		: db
				.select(columns)
				.from(profile)
				.innerJoin(rig, eq(rig.id, profile.rigId))
				.where(inArray(profile.id, ids));

/** The settings that several profiles set themselves, each in its order. */
export const settingsOf = async (db: Db, profileIds: number[]) =>
	profileIds.length === 0
		? []
		: db
				.select({
					profileId: profileSetting.profileId,
					menuPath: profileSetting.menuPath,
					setting: profileSetting.setting,
					value: profileSetting.value,
					unit: profileSetting.unit,
					quantity: profileSetting.quantity,
					note: profileSetting.note
				})
				.from(profileSetting)
				.where(inArray(profileSetting.profileId, profileIds))
				.orderBy(asc(profileSetting.profileId), asc(profileSetting.position));

/** The campaigns that measure each profile. */
export const campaignsOf = async (db: Db, profileIds: number[]) =>
	profileIds.length === 0
		? []
		: db
				.select({ profileId: campaignProfile.profileId, slug: campaign.slug, name: campaign.name })
				.from(campaignProfile)
				.innerJoin(campaign, eq(campaign.id, campaignProfile.campaignId))
				.where(inArray(campaignProfile.profileId, profileIds))
				.orderBy(asc(campaign.name));

/** Those of the profiles for which a run exists, voided ones included. */
export const measured = async (db: Db, profileIds: number[]): Promise<Set<number>> =>
	profileIds.length === 0
		? new Set()
		: new Set(
				(
					await db
						.selectDistinct({ id: campaignProfile.profileId })
						.from(campaignProfile)
						.innerJoin(
							run,
							and(
								eq(run.campaignId, campaignProfile.campaignId),
								eq(run.profileId, campaignProfile.profileId)
							)
						)
						.where(inArray(campaignProfile.profileId, profileIds))
				).map((row) => row.id)
			);

/** Locks profiles and their rows in campaigns, so that no run of them starts until the transaction ends. */
export async function lock(db: Db, ids: number[]): Promise<void> {
	if (ids.length === 0) return;
	await db.select({ id: profile.id }).from(profile).where(inArray(profile.id, ids)).for('update');
	await db
		.select({ id: campaignProfile.profileId })
		.from(campaignProfile)
		.where(inArray(campaignProfile.profileId, ids))
		.for('update');
}

type NewSetting = Omit<typeof profileSetting.$inferInsert, 'id' | 'profileId' | 'position'>;

async function writeSettings(db: Db, profileId: number, settings: NewSetting[]): Promise<void> {
	if (settings.length > 0)
		await db
			.insert(profileSetting)
			.values(settings.map((setting, position) => ({ ...setting, profileId, position })));
}

export async function insert(
	db: Db,
	row: typeof profile.$inferInsert,
	settings: NewSetting[]
): Promise<number> {
	const [created] = await db.insert(profile).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the profile.');
	await writeSettings(db, created.id, settings);
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof profile.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(profile)
		.set({ ...change, version: sql`${profile.version} + 1` })
		.where(and(eq(profile.id, id), eq(profile.version, seen)));
	return result.affectedRows === 1;
}

/** Puts a profile's settings in the place of those it had; the caller holds its lock. */
export async function replaceSettings(db: Db, profileId: number, settings: NewSetting[]): Promise<void> {
	await db.delete(profileSetting).where(eq(profileSetting.profileId, profileId));
	await writeSettings(db, profileId, settings);
}
