import { and, asc, count, desc, eq, inArray, max, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { campaignProfile, campaignWorkload, profile, rig, rigRevision, run, workload } from '../schema';

/** Every rig with its newest revision, by name. */
export async function rigChoices(db: Db) {
	const newest = db
		.select({ rigId: rigRevision.rigId, number: max(rigRevision.number).as('newest_number') })
		.from(rigRevision)
		.groupBy(rigRevision.rigId)
		.as('newest');
	return db
		.select({
			id: rig.id,
			slug: rig.slug,
			name: rig.name,
			revisionId: rigRevision.id,
			revision: rigRevision.number,
			firmware: rigRevision.firmware
		})
		.from(rig)
		.innerJoin(newest, eq(newest.rigId, rig.id))
		.innerJoin(rigRevision, and(eq(rigRevision.rigId, rig.id), eq(rigRevision.number, newest.number)))
		.orderBy(asc(rig.name), asc(rig.id));
}

/** The profiles of a rig, stock first. */
export const profileChoices = (db: Db, rigId: number) =>
	db
		.select({ id: profile.id, slug: profile.slug, name: profile.name, parentId: profile.parentId })
		.from(profile)
		.where(eq(profile.rigId, rigId))
		.orderBy(desc(sql`${profile.parentId} is null`), asc(profile.id));

/** Every workload, by class and name. */
export const workloadChoices = (db: Db) =>
	db
		.select({
			id: workload.id,
			slug: workload.slug,
			name: workload.name,
			programVersion: workload.programVersion,
			unit: workload.unit,
			better: workload.better,
			class: workload.class,
			repeats: workload.repeats
		})
		.from(workload)
		.orderBy(asc(workload.class), asc(workload.name), asc(workload.id));

export async function addProfiles(db: Db, campaignId: number, profileIds: number[], from: number) {
	if (profileIds.length === 0) return;
	await db
		.insert(campaignProfile)
		.values(profileIds.map((profileId, at) => ({ campaignId, profileId, position: from + at })));
}

export async function addWorkloads(
	db: Db,
	campaignId: number,
	chosen: { workloadId: number; repeats: number; instrumentId: number | null }[],
	from: number
) {
	if (chosen.length === 0) return;
	await db
		.insert(campaignWorkload)
		.values(chosen.map((row, at) => ({ campaignId, ...row, position: from + at })));
}

export const setRepeats = (db: Db, campaignId: number, workloadId: number, repeats: number) =>
	db
		.update(campaignWorkload)
		.set({ repeats })
		.where(and(eq(campaignWorkload.campaignId, campaignId), eq(campaignWorkload.workloadId, workloadId)));

export const removeProfile = (db: Db, campaignId: number, profileId: number) =>
	db
		.delete(campaignProfile)
		.where(and(eq(campaignProfile.campaignId, campaignId), eq(campaignProfile.profileId, profileId)));

export const removeWorkload = (db: Db, campaignId: number, workloadId: number) =>
	db
		.delete(campaignWorkload)
		.where(and(eq(campaignWorkload.campaignId, campaignId), eq(campaignWorkload.workloadId, workloadId)));

type PlanPart = { profileId: number } | { workloadId: number };

/** Locks one row or column of the plan until the transaction ends, so that no run begins in it meanwhile. */
export async function lockPart(db: Db, campaignId: number, part: PlanPart): Promise<void> {
	if ('profileId' in part)
		await db
			.select({ id: campaignProfile.profileId })
			.from(campaignProfile)
			.where(and(eq(campaignProfile.campaignId, campaignId), eq(campaignProfile.profileId, part.profileId)))
			.for('update');
	else
		await db
			.select({ id: campaignWorkload.workloadId })
			.from(campaignWorkload)
			.where(
				and(eq(campaignWorkload.campaignId, campaignId), eq(campaignWorkload.workloadId, part.workloadId))
			)
			.for('update');
}

/** Whether a row or column has runs, voided ones included, as it stands now. */
export async function isUsed(db: Db, campaignId: number, part: PlanPart): Promise<boolean> {
	const [row] = await db
		.select({ id: run.id })
		.from(run)
		.where(
			and(
				eq(run.campaignId, campaignId),
				'profileId' in part ? eq(run.profileId, part.profileId) : eq(run.workloadId, part.workloadId)
			)
		)
		.limit(1)
		.for('update');
	return row !== undefined;
}

/** The position after the last row and column of a plan. */
export async function nextPosition(db: Db, campaignId: number): Promise<number> {
	const [[rows], [columns]] = await Promise.all([
		db
			.select({ last: max(campaignProfile.position) })
			.from(campaignProfile)
			.where(eq(campaignProfile.campaignId, campaignId)),
		db
			.select({ last: max(campaignWorkload.position) })
			.from(campaignWorkload)
			.where(eq(campaignWorkload.campaignId, campaignId))
	]);
	return Math.max(rows?.last ?? 0, columns?.last ?? 0) + 1;
}

/** How many runs, voided ones included, each profile and workload of a campaign has. */
export const runCounts = (db: Db, campaignId: number) =>
	db
		.select({ profileId: run.profileId, workloadId: run.workloadId, runs: count() })
		.from(run)
		.where(eq(run.campaignId, campaignId))
		.groupBy(run.profileId, run.workloadId);

/** Columns of a plan that stay in it until the transaction ends; others may use them too. Drizzle's own word for it is not MariaDB's. */
async function shareWorkloads(db: Db, campaignId: number, workloadIds: number[]) {
	const [rows] = await db.execute(
		sql`select workload_id, repeats from campaign_workload where campaign_id = ${campaignId} and workload_id in ${workloadIds} order by workload_id lock in share mode`
	);
	return rows as unknown as { workload_id: number; repeats: number }[];
}

/**
 * Locks cells of a campaign against other writers until the transaction ends, by their row and column of the plan,
 * always in the same order. Returns what of them is in the plan. The row alone keeps two out of one cell; the column is
 * shared, so that those who fill different rows do not wait for each other's disk.
 */
export async function lockCells(
	db: Db,
	campaignId: number,
	profileIds: number[],
	workloadIds: number[]
): Promise<{ profileIds: number[]; needed: Map<number, number> }> {
	const profiles = await db
		.select({ id: campaignProfile.profileId })
		.from(campaignProfile)
		.where(and(eq(campaignProfile.campaignId, campaignId), inArray(campaignProfile.profileId, profileIds)))
		.orderBy(asc(campaignProfile.profileId))
		.for('update');
	const workloads = workloadIds.length > 0 ? await shareWorkloads(db, campaignId, workloadIds) : [];
	return {
		profileIds: profiles.map((row) => row.id),
		needed: new Map(workloads.map((row) => [row.workload_id, row.repeats]))
	};
}
