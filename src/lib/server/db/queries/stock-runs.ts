import { and, asc, count, eq, inArray, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, campaignProfile, profile, reading, rig, rigRevision, run, workload } from '../schema';

export interface StockFilter {
	rigs: number[];
	/** Only these; all when left out. */
	workload?: string;
}

/**
 * From the rig's root profile over the campaigns that have it to its runs: `campaign_profile_profile`, then `run_cell`
 * by its first two columns, so that nothing is read but stock.
 */
const stock = ({ rigs, workload: slug }: StockFilter) =>
	and(
		inArray(profile.rigId, rigs),
		isNull(profile.parentId),
		isNull(run.voidedAt),
		slug === undefined ? undefined : eq(workload.slug, slug)
	);

const runsOf = (db: Db, filter: StockFilter) =>
	db
		.select({
			id: run.id,
			rigSlug: rig.slug,
			rigName: rig.name,
			revision: rigRevision.number,
			campaign: campaign.slug,
			campaignName: campaign.name,
			workload: workload.slug,
			workloadName: workload.name,
			unit: workload.unit,
			better: workload.better,
			startedAt: run.startedAt
		})
		.from(profile)
		.innerJoin(campaignProfile, eq(campaignProfile.profileId, profile.id))
		.innerJoin(run, and(eq(run.campaignId, campaignProfile.campaignId), eq(run.profileId, profile.id)))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.innerJoin(campaign, eq(campaign.id, run.campaignId))
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, profile.rigId))
		.where(stock(filter))
		.orderBy(asc(run.startedAt), asc(run.id));

const readingsOf = (db: Db, filter: StockFilter) =>
	db
		.select({ runId: reading.runId, value: reading.value })
		.from(profile)
		.innerJoin(campaignProfile, eq(campaignProfile.profileId, profile.id))
		.innerJoin(run, and(eq(run.campaignId, campaignProfile.campaignId), eq(run.profileId, profile.id)))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.innerJoin(reading, eq(reading.runId, run.id))
		.where(and(stock(filter), isNull(reading.excludedAt)))
		.orderBy(asc(reading.runId), asc(reading.position));

export type StockRunRow = Awaited<ReturnType<typeof runsOf>>[number] & { values: number[] };

/** Stock of some rigs in the order it was run, with the readings that count: two queries however much there is. */
export async function ofRigs(db: Db, filter: StockFilter): Promise<StockRunRow[]> {
	if (filter.rigs.length === 0) return [];
	const [runs, readings] = await Promise.all([runsOf(db, filter), readingsOf(db, filter)]);
	const values = new Map<number, number[]>(runs.map((row) => [row.id, []]));
	for (const row of readings) values.get(row.runId)?.push(row.value);
	return runs.map((row) => ({ ...row, values: values.get(row.id) ?? [] }));
}

/** Rigs and workloads of which stock was ever run, for the choice. */
export const measured = (db: Db) =>
	db
		.select({
			rigId: rig.id,
			rig: rig.slug,
			rigName: rig.name,
			workload: workload.slug,
			workloadName: workload.name,
			runs: count()
		})
		.from(profile)
		.innerJoin(rig, eq(rig.id, profile.rigId))
		.innerJoin(campaignProfile, eq(campaignProfile.profileId, profile.id))
		.innerJoin(run, and(eq(run.campaignId, campaignProfile.campaignId), eq(run.profileId, profile.id)))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.where(and(isNull(profile.parentId), isNull(run.voidedAt)))
		.groupBy(rig.id, workload.id)
		.orderBy(asc(rig.name), asc(workload.name));
