import { and, asc, count, eq, inArray, or, sql } from 'drizzle-orm';
import type { WorkloadClass } from '../../../domain/bench/words';
import type { Db } from '../client';
import { campaign, campaignWorkload, run, workload } from '../schema';
import { behind, containsWords, idsAmong, ordered, type Way, type Window } from '../search';

export interface WorkloadFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	class?: WorkloadClass;
}

export type WorkloadSort = 'id' | 'name' | 'class' | 'newest';

const sorts = {
	id: [],
	name: [workload.name],
	class: [workload.class, workload.name],
	newest: [workload.createdAt]
} as const;

const matching = (filter: WorkloadFilter) =>
	and(
		behind(workload.id, filter.after),
		containsWords(filter.q, [workload.name, workload.slug, workload.quantity, workload.programVersion]),
		filter.class === undefined ? undefined : eq(workload.class, filter.class)
	);

export const list = (db: Db, filter: WorkloadFilter & { sort: WorkloadSort; way: Way } & Window) =>
	db
		.select()
		.from(workload)
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, workload.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: WorkloadFilter) =>
	(await db.select({ n: count() }).from(workload).where(matching(filter)))[0]?.n ?? 0;

/** Workloads by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select()
				.from(workload)
				.where(or(inArray(workload.slug, refs), ids.length ? inArray(workload.id, ids) : undefined));
};

/** The campaigns that run each workload, by name. */
export const campaignsOf = async (db: Db, workloadIds: number[]) =>
	workloadIds.length === 0
		? []
		: db
				.select({ workloadId: campaignWorkload.workloadId, slug: campaign.slug, name: campaign.name })
				.from(campaignWorkload)
				.innerJoin(campaign, eq(campaign.id, campaignWorkload.campaignId))
				.where(inArray(campaignWorkload.workloadId, workloadIds))
				.orderBy(asc(campaign.name));

/** How many campaigns run each workload. */
export const campaignCounts = async (db: Db, workloadIds: number[]) =>
	workloadIds.length === 0
		? []
		: db
				.select({ workloadId: campaignWorkload.workloadId, n: count() })
				.from(campaignWorkload)
				.where(inArray(campaignWorkload.workloadId, workloadIds))
				.groupBy(campaignWorkload.workloadId);

/** Those of the workloads for which a run exists, voided ones included. */
export const measured = async (db: Db, workloadIds: number[]): Promise<Set<number>> =>
	workloadIds.length === 0
		? new Set()
		: new Set(
				(
					await db
						.selectDistinct({ id: run.workloadId })
						.from(run)
						.where(inArray(run.workloadId, workloadIds))
				).map((row) => row.id)
			);

/** Locks a workload and its columns in campaigns, so that no run of it starts until the transaction ends. */
export async function lock(db: Db, id: number) {
	const [row] = await db.select().from(workload).where(eq(workload.id, id)).for('update');
	await db
		.select({ id: campaignWorkload.campaignId })
		.from(campaignWorkload)
		.where(eq(campaignWorkload.workloadId, id))
		.for('update');
	return row;
}

export async function insert(db: Db, row: typeof workload.$inferInsert): Promise<number> {
	const [created] = await db.insert(workload).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the workload.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof workload.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(workload)
		.set({ ...change, version: sql`${workload.version} + 1` })
		.where(and(eq(workload.id, id), eq(workload.version, seen)));
	return result.affectedRows === 1;
}
