import { and, asc, eq, inArray, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, cellSignature, profile, reading, run, user, workload } from '../schema';

/** All runs of several campaigns, voided ones included, in the order they were recorded. */
const runsOf = (db: Db, campaignIds: number[]) =>
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
		.where(inArray(run.campaignId, campaignIds))
		.orderBy(asc(run.id));

/** Their readings, excluded ones included, run by run in the order they were taken. */
const readingsOf = (db: Db, campaignIds: number[]) =>
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
		.where(inArray(run.campaignId, campaignIds))
		.orderBy(asc(reading.runId), asc(reading.position));

/** Their standing signatures. */
const signaturesOf = (db: Db, campaignIds: number[]) =>
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

export interface CampaignReadings {
	/** In the order they were recorded, voided ones included. */
	runs: (RunRow & { readings: ReadingRow[] })[];
	signatures: SignatureRow[];
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
	const ofRun = new Map<number, ReadingRow[]>(runs.map((row) => [row.id, []]));
	for (const row of readings) ofRun.get(row.runId)?.push(row);
	for (const row of runs) {
		found.get(row.campaignId)?.runs.push({ ...row, readings: ofRun.get(row.id) ?? [] });
	}
	for (const row of signatures) found.get(row.campaignId)?.signatures.push(row);
	return found;
}
