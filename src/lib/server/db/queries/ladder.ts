import { and, asc, count, eq, inArray, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { ladder, ladderStress, profile, rig, rigRevision, user, workload } from '../schema';
import {
	behind,
	containsWords,
	idsAmong,
	inArchive,
	ordered,
	type ArchiveState,
	type Way,
	type Window
} from '../search';

export interface LadderFilter {
	q: string;
	/** Slug of a rig; empty for every rig. */
	rig: string;
	state: ArchiveState;
	/** Only rows with a greater id. */
	after?: number;
}

export type LadderSort = 'id' | 'name' | 'newest' | 'tried';

const lastAttempt = sql<Date | null>`(select max(latest.started_at) from attempt latest where latest.ladder_id = ${ladder.id} and latest.voided_at is null)`;

const sorts: Record<LadderSort, Parameters<typeof ordered>[0]> = {
	id: [],
	name: [ladder.name],
	newest: [ladder.createdAt],
	tried: [lastAttempt]
};

const matching = ({ q, rig: rigSlug, state, after }: LadderFilter) =>
	and(
		behind(ladder.id, after),
		containsWords(q, [ladder.name, ladder.slug, rig.name, profile.name]),
		rigSlug === '' ? undefined : eq(rig.slug, rigSlug),
		inArchive(ladder.archivedAt, state)
	);

const columns = {
	id: ladder.id,
	slug: ladder.slug,
	name: ladder.name,
	purpose: ladder.purpose,
	stepMhz: ladder.stepMhz,
	limitClockMhz: ladder.limitClockMhz,
	limitVolts: ladder.limitVolts,
	limitTempC: ladder.limitTempC,
	limitSource: ladder.limitSource,
	createdBy: user.name,
	createdAt: ladder.createdAt,
	archivedAt: ladder.archivedAt,
	version: ladder.version,
	rigId: rig.id,
	rigSlug: rig.slug,
	rigName: rig.name,
	revision: rigRevision.number,
	profileId: profile.id,
	profileSlug: profile.slug,
	profileName: profile.name
};

const joined = (db: Db) =>
	db
		.select(columns)
		.from(ladder)
		.innerJoin(rigRevision, eq(rigRevision.id, ladder.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.innerJoin(profile, eq(profile.id, ladder.profileId))
		.innerJoin(user, eq(user.id, ladder.createdBy));

export const list = (db: Db, filter: LadderFilter & { sort: LadderSort; way: Way } & Window) =>
	joined(db)
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, ladder.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: LadderFilter) =>
	(
		await db
			.select({ n: count() })
			.from(ladder)
			.innerJoin(rigRevision, eq(rigRevision.id, ladder.rigRevisionId))
			.innerJoin(rig, eq(rig.id, rigRevision.rigId))
			.innerJoin(profile, eq(profile.id, ladder.profileId))
			.where(matching(filter))
	)[0]?.n ?? 0;

/** Ladders by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: joined(db).where(or(inArray(ladder.slug, refs), ids.length ? inArray(ladder.id, ids) : undefined));
};

/** The ladders of several rigs, archived ones too, the oldest first. */
export const ofRigs = async (db: Db, rigIds: number[]) =>
	rigIds.length === 0 ? [] : joined(db).where(inArray(rig.id, rigIds)).orderBy(asc(ladder.id));

export type LadderRow = Awaited<ReturnType<typeof byRefs>>[number];

/** The stresses of ladders in their order. */
export const stressesOf = async (db: Db, ladderIds: number[]) =>
	ladderIds.length === 0
		? []
		: db
				.select({
					ladderId: ladderStress.ladderId,
					workloadId: workload.id,
					slug: workload.slug,
					name: workload.name,
					kind: ladderStress.kind,
					minutes: ladderStress.minutes
				})
				.from(ladderStress)
				.innerJoin(workload, eq(workload.id, ladderStress.workloadId))
				.where(inArray(ladderStress.ladderId, ladderIds))
				.orderBy(asc(ladderStress.ladderId), asc(ladderStress.position));

export type StressRow = Awaited<ReturnType<typeof stressesOf>>[number];

/** Rigs that have ladders, for the list's filter. */
export const rigsUsed = (db: Db) =>
	db
		.selectDistinct({ slug: rig.slug, name: rig.name })
		.from(ladder)
		.innerJoin(rigRevision, eq(rigRevision.id, ladder.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.orderBy(asc(rig.name));

/** The ladder row, locked until the transaction ends. */
export const lock = async (db: Db, id: number) =>
	(await db.select().from(ladder).where(eq(ladder.id, id)).for('update'))[0];

export async function insert(
	db: Db,
	row: typeof ladder.$inferInsert,
	stresses: Omit<typeof ladderStress.$inferInsert, 'ladderId' | 'position'>[]
): Promise<number> {
	const [created] = await db.insert(ladder).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the ladder.');
	await db
		.insert(ladderStress)
		.values(stresses.map((stress, at) => ({ ...stress, ladderId: created.id, position: at + 1 })));
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof ladder.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(ladder)
		.set({ ...change, version: sql`${ladder.version} + 1` })
		.where(and(eq(ladder.id, id), eq(ladder.version, seen)));
	return result.affectedRows === 1;
}
