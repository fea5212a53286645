import { eq, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { profile, reading, run, user, workload } from '../schema';

export interface CellMark {
	profileId: number;
	workloadId: number;
	/** Another one whenever anything that is told of the cell's runs or readings is another. */
	mark: string;
}

/** What changes with any change of a row, and who made its run: names are told with the runs. */
const marks = sql<string>`concat_ws('/',
	${profile.slug}, ${workload.slug}, count(*), max(${run.id}), sum(${run.version}), max(${reading.id}),
	sum(crc32(concat_ws('|', ${run.id}, ${run.version}, ${run.startedAt}, ifnull(${run.ambientC}, 'none'), ${run.voidedAt}, ${user.name}))),
	sum(crc32(concat_ws('|', ${reading.id}, ${reading.value}, ${reading.excludedAt}, ${reading.excludeReason}))))`;

/**
 * A mark for each cell of a campaign that has runs: small beside the runs themselves, so that only the cells whose mark
 * is another need be read again. From what is stored, so that it does not matter who wrote it, and through what.
 */
export const ofCampaign = (db: Db, campaignId: number): Promise<CellMark[]> =>
	db
		.select({ profileId: run.profileId, workloadId: run.workloadId, mark: marks })
		.from(run)
		.innerJoin(profile, eq(profile.id, run.profileId))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.innerJoin(user, eq(user.id, run.testerId))
		.leftJoin(reading, eq(reading.runId, run.id))
		.where(eq(run.campaignId, campaignId))
		.groupBy(run.profileId, run.workloadId);
