import { and, asc, count, eq, inArray, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { profile, rig, rigRevision, sweep, user, workload } from '../schema';
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

export interface SweepFilter {
	q: string;
	/** Slug of a rig; empty for every rig. */
	rig: string;
	state: ArchiveState;
	/** Only rows with a greater id. */
	after?: number;
}

export type SweepSort = 'id' | 'name' | 'newest' | 'driven';

const lastPass = sql<Date | null>`(select max(latest.started_at) from sweep_pass latest where latest.sweep_id = ${sweep.id} and latest.voided_at is null)`;

const sorts: Record<SweepSort, Parameters<typeof ordered>[0]> = {
	id: [],
	name: [sweep.name],
	newest: [sweep.createdAt],
	driven: [lastPass]
};

const matching = ({ q, rig: rigSlug, state, after }: SweepFilter) =>
	and(
		behind(sweep.id, after),
		containsWords(q, [sweep.name, sweep.slug, rig.name, profile.name, workload.name]),
		rigSlug === '' ? undefined : eq(rig.slug, rigSlug),
		inArchive(sweep.archivedAt, state)
	);

const columns = {
	id: sweep.id,
	slug: sweep.slug,
	name: sweep.name,
	purpose: sweep.purpose,
	wantedClockMhz: sweep.wantedClockMhz,
	currentStepA: sweep.currentStepA,
	createdBy: user.name,
	createdAt: sweep.createdAt,
	archivedAt: sweep.archivedAt,
	version: sweep.version,
	rigId: rig.id,
	rigSlug: rig.slug,
	rigName: rig.name,
	revision: rigRevision.number,
	profileSlug: profile.slug,
	profileName: profile.name,
	workloadSlug: workload.slug,
	workloadName: workload.name
};

const joined = (db: Db) =>
	db
		.select(columns)
		.from(sweep)
		.innerJoin(rigRevision, eq(rigRevision.id, sweep.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.innerJoin(profile, eq(profile.id, sweep.profileId))
		.innerJoin(workload, eq(workload.id, sweep.workloadId))
		.innerJoin(user, eq(user.id, sweep.createdBy));

export const list = (db: Db, filter: SweepFilter & { sort: SweepSort; way: Way } & Window) =>
	joined(db)
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, sweep.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: SweepFilter) =>
	(
		await db
			.select({ n: count() })
			.from(sweep)
			.innerJoin(rigRevision, eq(rigRevision.id, sweep.rigRevisionId))
			.innerJoin(rig, eq(rig.id, rigRevision.rigId))
			.innerJoin(profile, eq(profile.id, sweep.profileId))
			.innerJoin(workload, eq(workload.id, sweep.workloadId))
			.where(matching(filter))
	)[0]?.n ?? 0;

/** Sweeps by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: joined(db).where(or(inArray(sweep.slug, refs), ids.length ? inArray(sweep.id, ids) : undefined));
};

/** The sweeps of several rigs, archived ones too, the oldest first. */
export const ofRigs = async (db: Db, rigIds: number[]) =>
	rigIds.length === 0 ? [] : joined(db).where(inArray(rig.id, rigIds)).orderBy(asc(sweep.id));

export type SweepRow = Awaited<ReturnType<typeof byRefs>>[number];

/** Rigs that have sweeps, for the list's filter. */
export const rigsUsed = (db: Db) =>
	db
		.selectDistinct({ slug: rig.slug, name: rig.name })
		.from(sweep)
		.innerJoin(rigRevision, eq(rigRevision.id, sweep.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.orderBy(asc(rig.name));

/** The sweep row, locked until the transaction ends. */
export const lock = async (db: Db, id: number) =>
	(await db.select().from(sweep).where(eq(sweep.id, id)).for('update'))[0];

export async function insert(db: Db, row: typeof sweep.$inferInsert): Promise<number> {
	const [created] = await db.insert(sweep).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the sweep.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof sweep.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(sweep)
		.set({ ...change, version: sql`${sweep.version} + 1` })
		.where(and(eq(sweep.id, id), eq(sweep.version, seen)));
	return result.affectedRows === 1;
}
