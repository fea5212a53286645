import { and, asc, count, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { suite, suiteWorkload, workload } from '../schema';
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

export interface SuiteFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	state: ArchiveState;
}

export type SuiteSort = 'id' | 'name' | 'newest';

const sorts = { id: [], name: [suite.name], newest: [suite.createdAt] } as const;

const matching = ({ q, state, after }: SuiteFilter) =>
	and(
		behind(suite.id, after),
		containsWords(q, [suite.name, suite.slug, suite.purpose]),
		inArchive(suite.archivedAt, state)
	);

export const list = (db: Db, filter: SuiteFilter & { sort: SuiteSort; way: Way } & Window) =>
	db
		.select()
		.from(suite)
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, suite.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: SuiteFilter) =>
	(await db.select({ n: count() }).from(suite).where(matching(filter)))[0]?.n ?? 0;

/** Suites to plan from, by name. */
export const choices = (db: Db) =>
	db
		.select({ slug: suite.slug, name: suite.name })
		.from(suite)
		.where(isNull(suite.archivedAt))
		.orderBy(asc(suite.name), asc(suite.id));

/** Suites by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select()
				.from(suite)
				.where(or(inArray(suite.slug, refs), ids.length ? inArray(suite.id, ids) : undefined));
};

/** The workloads of several suites with the readings each cell needs, in the suite's order. */
export const workloadsOf = async (db: Db, suiteIds: number[]) =>
	suiteIds.length === 0
		? []
		: db
				.select({
					suiteId: suiteWorkload.suiteId,
					slug: workload.slug,
					name: workload.name,
					programVersion: workload.programVersion,
					unit: workload.unit,
					better: workload.better,
					class: workload.class,
					repeats: suiteWorkload.repeats
				})
				.from(suiteWorkload)
				.innerJoin(workload, eq(workload.id, suiteWorkload.workloadId))
				.where(inArray(suiteWorkload.suiteId, suiteIds))
				.orderBy(asc(suiteWorkload.suiteId), asc(suiteWorkload.position), asc(workload.id));

type Chosen = { workloadId: number; repeats: number }[];

async function writeWorkloads(db: Db, suiteId: number, chosen: Chosen): Promise<void> {
	if (chosen.length > 0)
		await db.insert(suiteWorkload).values(chosen.map((row, at) => ({ suiteId, ...row, position: at + 1 })));
}

export async function insert(db: Db, row: typeof suite.$inferInsert, chosen: Chosen): Promise<number> {
	const [created] = await db.insert(suite).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the suite.');
	await writeWorkloads(db, created.id, chosen);
	return created.id;
}

/** Writes an edit over the version it saw, with other workloads where they are given; false when somebody was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof suite.$inferInsert>,
	chosen?: Chosen
): Promise<boolean> {
	const [result] = await db
		.update(suite)
		.set({ ...change, version: sql`${suite.version} + 1` })
		.where(and(eq(suite.id, id), eq(suite.version, seen)));
	if (result.affectedRows !== 1) return false;
	if (chosen) {
		await db.delete(suiteWorkload).where(eq(suiteWorkload.suiteId, id));
		await writeWorkloads(db, id, chosen);
	}
	return true;
}
