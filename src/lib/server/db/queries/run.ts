import { and, eq, inArray, like, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { profile, run, user, workload } from '../schema';

export async function insert(db: Db, row: typeof run.$inferInsert): Promise<number> {
	const [created] = await db.insert(run).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the run.');
	return created.id;
}

/** Several runs at once, each with a key of its own; their ids by key, for a cluster does not count in steps of one. */
export async function insertMany(
	db: Db,
	testerId: string,
	rows: (Omit<typeof run.$inferInsert, 'testerId'> & { clientKey: string })[]
): Promise<Map<string, number>> {
	if (rows.length === 0) return new Map();
	await db.insert(run).values(rows.map((row) => ({ ...row, testerId })));
	const written = await db
		.select({ id: run.id, clientKey: run.clientKey })
		.from(run)
		.where(
			and(
				eq(run.testerId, testerId),
				inArray(
					run.clientKey,
					rows.map((row) => row.clientKey)
				)
			)
		);
	return new Map(written.flatMap((row) => (row.clientKey === null ? [] : [[row.clientKey, row.id]])));
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

/** The run that a tester's client made under a key. Not locked: a key not used yet has no row, only a gap that others need. */
export const byKey = async (db: Db, testerId: string, clientKey: string) =>
	(
		await db
			.select()
			.from(run)
			.where(and(eq(run.testerId, testerId), eq(run.clientKey, clientKey)))
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

/** Who made some runs, by run. */
export async function testersOf(db: Db, ids: number[]): Promise<Map<number, string>> {
	if (ids.length === 0) return new Map();
	const rows = await db
		.select({ id: run.id, tester: user.name })
		.from(run)
		.innerJoin(user, eq(user.id, run.testerId))
		.where(inArray(run.id, ids));
	return new Map(rows.map((row) => [row.id, row.tester]));
}
