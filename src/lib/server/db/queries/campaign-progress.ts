import { and, count, countDistinct, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { campaignProfile, campaignWorkload, cellSignature, reading, run } from '../schema';

export interface CampaignProgress {
	profiles: number;
	workloads: number;
	/** Readings the plan asks for. */
	needed: number;
	/** Readings taken that count, a cell never counting for more than it needs. */
	taken: number;
	/** Runs not voided. */
	runs: number;
	/** Cells with a standing signature. */
	signed: number;
}

const rowsOf = (db: Db, ids: number[]) =>
	db
		.select({ campaignId: campaignProfile.campaignId, profiles: count() })
		.from(campaignProfile)
		.where(inArray(campaignProfile.campaignId, ids))
		.groupBy(campaignProfile.campaignId);

const columnsOf = (db: Db, ids: number[]) =>
	db
		.select({
			campaignId: campaignWorkload.campaignId,
			workloads: count(),
			repeats: sql<number>`sum(${campaignWorkload.repeats})`.mapWith(Number)
		})
		.from(campaignWorkload)
		.where(inArray(campaignWorkload.campaignId, ids))
		.groupBy(campaignWorkload.campaignId);

function takenOf(db: Db, ids: number[]) {
	const cells = db
		.select({
			campaignId: run.campaignId,
			workloadId: run.workloadId,
			runs: countDistinct(run.id).as('cell_runs'),
			readings: count(reading.id).as('cell_readings')
		})
		.from(run)
		.leftJoin(reading, and(eq(reading.runId, run.id), isNull(reading.excludedAt)))
		.where(and(inArray(run.campaignId, ids), isNull(run.voidedAt)))
		.groupBy(run.campaignId, run.workloadId, run.profileId)
		.as('cells');
	return db
		.select({
			campaignId: cells.campaignId,
			runs: sql<number>`sum(${cells.runs})`.mapWith(Number),
			taken: sql<number>`sum(least(${cells.readings}, ${campaignWorkload.repeats}))`.mapWith(Number)
		})
		.from(cells)
		.innerJoin(
			campaignWorkload,
			and(
				eq(campaignWorkload.campaignId, cells.campaignId),
				eq(campaignWorkload.workloadId, cells.workloadId)
			)
		)
		.groupBy(cells.campaignId);
}

const signedOf = (db: Db, ids: number[]) =>
	db
		.select({ campaignId: cellSignature.campaignId, signed: count() })
		.from(cellSignature)
		.where(and(inArray(cellSignature.campaignId, ids), isNull(cellSignature.removedAt)))
		.groupBy(cellSignature.campaignId);

/** How far several campaigns are: four grouped queries however many. */
export async function ofCampaigns(db: Db, ids: number[]): Promise<Map<number, CampaignProgress>> {
	const found = new Map<number, CampaignProgress>(
		ids.map((id) => [id, { profiles: 0, workloads: 0, needed: 0, taken: 0, runs: 0, signed: 0 }])
	);
	if (ids.length === 0) return found;
	const [rows, columns, taken, signed] = await Promise.all([
		rowsOf(db, ids),
		columnsOf(db, ids),
		takenOf(db, ids),
		signedOf(db, ids)
	]);
	for (const { campaignId, ...more } of [...rows, ...columns, ...taken, ...signed]) {
		const one = found.get(campaignId);
		if (one) Object.assign(one, more);
	}
	for (const { campaignId, repeats } of columns) {
		const one = found.get(campaignId);
		if (one) one.needed = repeats * one.profiles;
	}
	return found;
}
