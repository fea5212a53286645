import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, cellSignature, profile, reading, run, user, workload } from '../schema';

interface Cells {
	campaignId: number;
	cells: readonly { profileId: number; workloadId: number }[];
}

/** All runs of some campaigns, or those of some cells of one. */
const wanted = (of: number[] | Cells) =>
	Array.isArray(of)
		? inArray(run.campaignId, of)
		: and(
				eq(run.campaignId, of.campaignId),
				sql`(${run.profileId}, ${run.workloadId}) in (${sql.join(
					of.cells.map((cell) => sql`(${cell.profileId}, ${cell.workloadId})`),
					sql`, `
				)})`
			);

/** Runs, voided ones included, in the order they were recorded. */
const runsOf = (db: Db, of: number[] | Cells) =>
	db
		.select({
			id: run.id,
			campaignId: run.campaignId,
			profileId: run.profileId,
			workloadId: run.workloadId,
			profile: profile.slug,
			workload: workload.slug,
			tester: user.name,
			testerId: run.testerId,
			version: run.version,
			source: run.source,
			clientKey: run.clientKey,
			startedAt: run.startedAt,
			ambientC: run.ambientC,
			notes: run.notes,
			createdAt: run.createdAt,
			voidedAt: run.voidedAt,
			voidReason: run.voidReason
		})
		.from(run)
		.innerJoin(profile, eq(profile.id, run.profileId))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.innerJoin(user, eq(user.id, run.testerId))
		.where(wanted(of))
		.orderBy(asc(run.id));

/** Their readings, excluded ones included, run by run in the order they were taken. */
const readingsOf = (db: Db, of: number[] | Cells) =>
	db
		.select({
			id: reading.id,
			runId: reading.runId,
			position: reading.position,
			value: reading.value,
			clientKey: reading.clientKey,
			excludedAt: reading.excludedAt,
			excludeReason: reading.excludeReason
		})
		.from(run)
		.innerJoin(reading, eq(reading.runId, run.id))
		.where(wanted(of))
		.orderBy(asc(reading.runId), asc(reading.position));

/** Standing signatures of some campaigns. */
export const signaturesOf = (db: Db, campaignIds: number[]) =>
	db
		.select({
			campaignId: cellSignature.campaignId,
			profile: profile.slug,
			workload: workload.slug,
			signedBy: user.name,
			signedAt: cellSignature.signedAt
		})
		.from(cellSignature)
		.innerJoin(campaign, eq(campaign.id, cellSignature.campaignId))
		.innerJoin(profile, eq(profile.id, cellSignature.profileId))
		.innerJoin(workload, eq(workload.id, cellSignature.workloadId))
		.innerJoin(user, eq(user.id, cellSignature.signedBy))
		.where(and(inArray(cellSignature.campaignId, campaignIds), isNull(cellSignature.removedAt)))
		.orderBy(asc(cellSignature.id));

export type RunRow = Awaited<ReturnType<typeof runsOf>>[number];
export type ReadingRow = Awaited<ReturnType<typeof readingsOf>>[number];
export type SignatureRow = Awaited<ReturnType<typeof signaturesOf>>[number];

export type RecordedRun = RunRow & { readings: ReadingRow[] };

export interface CampaignReadings {
	/** In the order they were recorded, voided ones included. */
	runs: RecordedRun[];
	signatures: SignatureRow[];
}

function joined(runs: RunRow[], readings: ReadingRow[]): RecordedRun[] {
	const ofRun = new Map<number, ReadingRow[]>(runs.map((row) => [row.id, []]));
	for (const row of readings) ofRun.get(row.runId)?.push(row);
	return runs.map((row) => ({ ...row, readings: ofRun.get(row.id) ?? [] }));
}

/** The runs of some cells of a campaign, with their readings: two queries however many. */
export async function runsOfCells(db: Db, of: Cells): Promise<RecordedRun[]> {
	if (of.cells.length === 0) return [];
	const [runs, readings] = await Promise.all([runsOf(db, of), readingsOf(db, of)]);
	return joined(runs, readings);
}

/** Every run with its readings, and every standing signature, of several campaigns: three queries however many. */
export async function forCampaigns(db: Db, campaignIds: number[]): Promise<Map<number, CampaignReadings>> {
	const found = new Map<number, CampaignReadings>(
		campaignIds.map((id) => [id, { runs: [], signatures: [] }])
	);
	if (campaignIds.length === 0) return found;
	const [runs, readings, signatures] = await Promise.all([
		runsOf(db, campaignIds),
		readingsOf(db, campaignIds),
		signaturesOf(db, campaignIds)
	]);
	for (const row of joined(runs, readings)) found.get(row.campaignId)?.runs.push(row);
	for (const row of signatures) found.get(row.campaignId)?.signatures.push(row);
	return found;
}
