import { asc, desc, eq, inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, campaignProfile, part, rigRevision, rigSample, run, sample, user } from '../schema';

/** All revisions of several rigs, newest first, with who wrote them. */
export const ofRigs = async (db: Db, rigIds: number[]) =>
	rigIds.length === 0
		? []
		: db
				.select({
					id: rigRevision.id,
					rigId: rigRevision.rigId,
					number: rigRevision.number,
					firmware: rigRevision.firmware,
					driver: rigRevision.driver,
					os: rigRevision.os,
					change: rigRevision.change,
					createdAt: rigRevision.createdAt,
					createdBy: user.name
				})
				.from(rigRevision)
				.innerJoin(user, eq(user.id, rigRevision.createdBy))
				.where(inArray(rigRevision.rigId, rigIds))
				.orderBy(desc(rigRevision.number));

/** The samples of several revisions with their parts, in the revision's order. */
export const samplesOf = async (db: Db, revisionIds: number[]) =>
	revisionIds.length === 0
		? []
		: db
				.select({
					revisionId: rigSample.rigRevisionId,
					sampleId: sample.id,
					slug: sample.slug,
					serial: sample.serial,
					provenance: sample.provenance,
					partId: part.id,
					partSlug: part.slug,
					maker: part.maker,
					model: part.model,
					kind: part.kind
				})
				.from(rigSample)
				.innerJoin(sample, eq(sample.id, rigSample.sampleId))
				.innerJoin(part, eq(part.id, sample.partId))
				.where(inArray(rigSample.rigRevisionId, revisionIds))
				.orderBy(asc(rigSample.position));

/** The campaigns on several revisions. */
export const campaignsOf = async (db: Db, revisionIds: number[]) =>
	revisionIds.length === 0
		? []
		: db
				.select({ revisionId: campaign.rigRevisionId, slug: campaign.slug, name: campaign.name })
				.from(campaign)
				.where(inArray(campaign.rigRevisionId, revisionIds))
				.orderBy(asc(campaign.name));

/** Those of the revisions on which a run exists, voided ones included. */
export const measured = async (db: Db, revisionIds: number[]): Promise<Set<number>> =>
	revisionIds.length === 0
		? new Set()
		: new Set(
				(
					await db
						.selectDistinct({ id: campaign.rigRevisionId })
						.from(campaign)
						.innerJoin(run, eq(run.campaignId, campaign.id))
						.where(inArray(campaign.rigRevisionId, revisionIds))
				).map((row) => row.id)
			);

/** Locks a revision and the cells of its campaigns, so that no run starts on it until the transaction ends. */
export async function lock(db: Db, id: number) {
	const [row] = await db.select().from(rigRevision).where(eq(rigRevision.id, id)).for('update');
	await db
		.select({ id: campaignProfile.profileId })
		.from(campaignProfile)
		.innerJoin(campaign, eq(campaign.id, campaignProfile.campaignId))
		.where(eq(campaign.rigRevisionId, id))
		.for('update');
	return row;
}

async function writeSamples(db: Db, rigRevisionId: number, sampleIds: number[]): Promise<void> {
	if (sampleIds.length > 0)
		await db
			.insert(rigSample)
			.values(sampleIds.map((sampleId, position) => ({ rigRevisionId, sampleId, position })));
}

export async function insert(
	db: Db,
	row: typeof rigRevision.$inferInsert,
	sampleIds: number[]
): Promise<number> {
	const [created] = await db.insert(rigRevision).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the revision.');
	await writeSamples(db, created.id, sampleIds);
	return created.id;
}

/** Writes a correction of a revision that nothing was measured on; the caller holds its lock. */
export async function correct(
	db: Db,
	id: number,
	change: Partial<typeof rigRevision.$inferInsert>,
	sampleIds: number[]
): Promise<void> {
	await db.update(rigRevision).set(change).where(eq(rigRevision.id, id));
	await db.delete(rigSample).where(eq(rigSample.rigRevisionId, id));
	await writeSamples(db, id, sampleIds);
}
