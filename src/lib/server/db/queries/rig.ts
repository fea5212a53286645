import { and, count, eq, inArray, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, profile, rig, rigRevision, rigSample } from '../schema';
import { behind, containsWords, idsAmong, ordered, type Way, type Window } from '../search';

export interface RigFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	/** Rigs whose newest revision has the sample. */
	sampleId?: number;
}

export type RigSort = 'id' | 'name' | 'newest' | 'revised';

/** The newest revision of each rig. */
const newestRevision = sql`${rigRevision.number} = (select max(newest.number) from rig_revision newest where newest.rig_id = ${rig.id})`;

const sorts = {
	id: [],
	name: [rig.name],
	newest: [rig.createdAt],
	revised: [rigRevision.createdAt]
} as const;

const matching = ({ q, sampleId, after }: RigFilter) =>
	and(
		behind(rig.id, after),
		containsWords(q, [rig.name, rig.slug, rigRevision.firmware, rigRevision.os]),
		sampleId === undefined
			? undefined
			: sql`exists (select 1 from ${rigSample} where ${rigSample.rigRevisionId} = ${rigRevision.id} and ${rigSample.sampleId} = ${sampleId})`
	);

const columns = {
	id: rig.id,
	slug: rig.slug,
	name: rig.name,
	firmwareFamily: rig.firmwareFamily,
	createdAt: rig.createdAt,
	version: rig.version,
	revisionId: rigRevision.id,
	revision: rigRevision.number,
	firmware: rigRevision.firmware,
	driver: rigRevision.driver,
	os: rigRevision.os,
	revisedAt: rigRevision.createdAt
};

/** Rigs as they stand now. */
export const list = (db: Db, filter: RigFilter & { sort: RigSort; way: Way } & Window) =>
	db
		.select(columns)
		.from(rig)
		.innerJoin(rigRevision, and(eq(rigRevision.rigId, rig.id), newestRevision))
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, rig.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: RigFilter) =>
	(
		await db
			.select({ n: count() })
			.from(rig)
			.innerJoin(rigRevision, and(eq(rigRevision.rigId, rig.id), newestRevision))
			.where(matching(filter))
	)[0]?.n ?? 0;

/** Rigs as they stand now by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select(columns)
				.from(rig)
				.innerJoin(rigRevision, and(eq(rigRevision.rigId, rig.id), newestRevision))
				.where(or(inArray(rig.slug, refs), ids.length ? inArray(rig.id, ids) : undefined));
};

/** Profiles of each rig, stock included. */
export const profileCounts = async (db: Db, rigIds: number[]) =>
	rigIds.length === 0
		? []
		: db
				.select({ rigId: profile.rigId, n: count() })
				.from(profile)
				.where(inArray(profile.rigId, rigIds))
				.groupBy(profile.rigId);

/** Campaigns on each rig, whatever its revision. */
export const campaignCounts = async (db: Db, rigIds: number[]) =>
	rigIds.length === 0
		? []
		: db
				.select({ rigId: rigRevision.rigId, n: count() })
				.from(campaign)
				.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
				.where(inArray(rigRevision.rigId, rigIds))
				.groupBy(rigRevision.rigId);

export async function insert(db: Db, row: typeof rig.$inferInsert): Promise<number> {
	const [created] = await db.insert(rig).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the rig.');
	return created.id;
}

/** Raises the version that an edit saw, with its change; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof rig.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(rig)
		.set({ ...change, version: sql`${rig.version} + 1` })
		.where(and(eq(rig.id, id), eq(rig.version, seen)));
	return result.affectedRows === 1;
}
