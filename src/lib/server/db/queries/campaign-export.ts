import { and, asc, eq, gt, inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { profile, reading, run, user, workload } from '../schema';

/** The next runs of a campaign after one, voided ones included, in the order they were recorded. */
export const runsAfter = (db: Db, campaignId: number, after: number, limit: number) =>
	db
		.select({
			id: run.id,
			profile: profile.slug,
			workload: workload.slug,
			unit: workload.unit,
			startedAt: run.startedAt,
			ambientC: run.ambientC,
			tester: user.name,
			source: run.source,
			voidReason: run.voidReason,
			notes: run.notes
		})
		.from(run)
		.innerJoin(profile, eq(profile.id, run.profileId))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.innerJoin(user, eq(user.id, run.testerId))
		.where(and(eq(run.campaignId, campaignId), gt(run.id, after)))
		.orderBy(asc(run.id))
		.limit(limit);

/** The readings of some runs, excluded ones included, in the order they were taken. */
export const readingsOf = async (db: Db, runIds: number[]) =>
	runIds.length === 0
		? []
		: db
				.select({ runId: reading.runId, value: reading.value, excludeReason: reading.excludeReason })
				.from(reading)
				.where(inArray(reading.runId, runIds))
				.orderBy(asc(reading.runId), asc(reading.position));
