import { and, eq, like, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { profile, run, user, workload } from '../schema';

export async function insert(db: Db, row: typeof run.$inferInsert): Promise<number> {
	const [created] = await db.insert(run).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the run.');
	return created.id;
}

/** Several runs at once; their ids in the order given. */
export async function insertMany(db: Db, rows: (typeof run.$inferInsert)[]): Promise<number[]> {
	if (rows.length === 0) return [];
	const created = await db.insert(run).values(rows).$returningId();
	return created.map((row) => row.id);
}

/** The run row, locked until the transaction ends. */
export const lock = async (db: Db, id: number) =>
	(await db.select().from(run).where(eq(run.id, id)).for('update'))[0];

/** Which cell a run is in, without a lock; its cell is locked first. */
export const cellOf = async (db: Db, id: number) =>
	(
		await db
			.select({
				campaignId: run.campaignId,
				profileId: run.profileId,
				workloadId: run.workloadId,
				profile: profile.slug,
				workload: workload.slug
			})
			.from(run)
			.innerJoin(profile, eq(profile.id, run.profileId))
			.innerJoin(workload, eq(workload.id, run.workloadId))
			.where(eq(run.id, id))
			.limit(1)
	)[0];

/** The run that a tester's client made under a key, locked. */
export const lockByKey = async (db: Db, testerId: string, clientKey: string) =>
	(
		await db
			.select()
			.from(run)
			.where(and(eq(run.testerId, testerId), eq(run.clientKey, clientKey)))
			.for('update')
	)[0];

/** Runs of a campaign whose key begins so, with who made them: those of one imported file. */
export const withKeyPrefix = (db: Db, campaignId: number, prefix: string) =>
	db
		.select({
			id: run.id,
			clientKey: run.clientKey,
			createdAt: run.createdAt,
			voidedAt: run.voidedAt,
			tester: user.name
		})
		.from(run)
		.innerJoin(user, eq(user.id, run.testerId))
		.where(and(eq(run.campaignId, campaignId), like(run.clientKey, `${prefix}%`)));

export const markVoid = (
	db: Db,
	id: number,
	change: { voidedAt: Date; voidedBy: string; voidReason: string }
) =>
	db
		.update(run)
		.set({ ...change, version: sql`${run.version} + 1` })
		.where(eq(run.id, id));

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	version: number,
	change: { ambientC: number | null; startedAt: Date; notes: string }
): Promise<boolean> {
	const [result] = await db
		.update(run)
		.set({ ...change, version: version + 1 })
		.where(and(eq(run.id, id), eq(run.version, version)));
	return result.affectedRows === 1;
}
