import { and, asc, eq, exists, gte, inArray, isNull, lt, sql } from 'drizzle-orm';
import type { Db } from '../client';
import {
	campaign,
	part,
	profile,
	reading,
	rig,
	rigRevision,
	rigSample,
	run,
	sample,
	user,
	workload
} from '../schema';

export interface ExploreFilter {
	rig?: string;
	part?: string;
	from?: Date;
	/** Runs that began before this. */
	before?: Date;
}

/** Runs that one look may hold; what lies before them is left out, and the page says so. */
export const mostRuns = 3000;

/** Runs that count, of the rigs named or of those with the part in them. */
const matching = (db: Db, { rig: slug, part: partSlug, from, before }: ExploreFilter) =>
	and(
		isNull(run.voidedAt),
		slug === undefined ? undefined : eq(rig.slug, slug),
		from && gte(run.startedAt, from),
		before && lt(run.startedAt, before),
		partSlug === undefined
			? undefined
			: exists(
					db
						.select({ one: sql`1` })
						.from(rigSample)
						.innerJoin(sample, eq(sample.id, rigSample.sampleId))
						.innerJoin(part, eq(part.id, sample.partId))
						.where(and(eq(rigSample.rigRevisionId, campaign.rigRevisionId), eq(part.slug, partSlug)))
				)
	);

/** The newest runs first, with all that a plate says of them. */
export const runs = (db: Db, filter: ExploreFilter) =>
	db
		.select({
			id: run.id,
			rig: rig.slug,
			rigName: rig.name,
			profile: profile.slug,
			profileName: profile.name,
			parentId: profile.parentId,
			tester: user.name,
			startedAt: run.startedAt,
			ambientC: run.ambientC,
			workload: {
				slug: workload.slug,
				name: workload.name,
				programVersion: workload.programVersion,
				settings: workload.settings,
				quantity: workload.quantity,
				unit: workload.unit,
				better: workload.better,
				class: workload.class,
				headline: workload.headline,
				leastDifferencePercent: workload.leastDifferencePercent,
				warmUps: workload.warmUps,
				repeats: workload.repeats,
				coolDownS: workload.coolDownS
			}
		})
		.from(campaign)
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.innerJoin(run, eq(run.campaignId, campaign.id))
		.innerJoin(profile, eq(profile.id, run.profileId))
		.innerJoin(workload, eq(workload.id, run.workloadId))
		.innerJoin(user, eq(user.id, run.testerId))
		.where(matching(db, filter))
		.orderBy(sql`${run.startedAt} desc`, sql`${run.id} desc`)
		.limit(mostRuns);

export type ExploredRun = Awaited<ReturnType<typeof runs>>[number];

/** The readings of runs that count, in the order they were taken. */
export const readingsOf = async (db: Db, runIds: number[]) =>
	runIds.length === 0
		? []
		: db
				.select({ runId: reading.runId, value: reading.value })
				.from(reading)
				.where(and(inArray(reading.runId, runIds), isNull(reading.excludedAt)))
				.orderBy(asc(reading.runId), asc(reading.position));

/** Parts that are in a rig with a campaign, by name. */
export const parts = (db: Db) =>
	db
		.selectDistinct({ slug: part.slug, maker: part.maker, model: part.model })
		.from(campaign)
		.innerJoin(rigSample, eq(rigSample.rigRevisionId, campaign.rigRevisionId))
		.innerJoin(sample, eq(sample.id, rigSample.sampleId))
		.innerJoin(part, eq(part.id, sample.partId))
		.orderBy(asc(part.maker), asc(part.model));
