import { and, asc, eq, gt, inArray, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { embargo, loan, loanSample, part, rigSample, sample } from '../schema';

/** The samples of some rig revisions, each once. */
const samplesOf = (db: Db, rigRevisionIds: number[]) =>
	db
		.selectDistinct({
			id: sample.id,
			slug: sample.slug,
			provenance: sample.provenance,
			maker: part.maker,
			model: part.model
		})
		.from(rigSample)
		.innerJoin(sample, eq(sample.id, rigSample.sampleId))
		.innerJoin(part, eq(part.id, sample.partId))
		.where(inArray(rigSample.rigRevisionId, rigRevisionIds))
		.orderBy(asc(sample.id));

/** What was agreed for samples with each loan that brought them, the earliest first. */
const disclosuresOf = (db: Db, sampleIds: number[]) =>
	db
		.select({ sampleId: loanSample.sampleId, disclosure: loan.disclosure })
		.from(loanSample)
		.innerJoin(loan, eq(loan.id, loanSample.loanId))
		// What was only asked for or promised never reached the bench.
		.where(
			and(
				inArray(loanSample.sampleId, sampleIds),
				inArray(loan.stage, ['in-transit', 'here', 'going-back', 'returned', 'kept', 'lost'])
			)
		)
		.orderBy(asc(loan.id));

/** Embargoes on samples that still hold at a moment. */
const standingEmbargoesOf = (db: Db, sampleIds: number[], now: Date) =>
	db
		.select({ sampleId: embargo.sampleId, field: embargo.field, until: embargo.until })
		.from(embargo)
		.where(and(inArray(embargo.sampleId, sampleIds), isNull(embargo.liftedAt), gt(embargo.until, now)))
		.orderBy(asc(embargo.until));

/** What comes with the samples of some rig revisions: provenance, agreed disclosures, standing embargoes. Three queries however many. */
export async function ofRigRevisions(db: Db, rigRevisionIds: number[], now: Date) {
	if (rigRevisionIds.length === 0) return [];
	const samples = await samplesOf(db, rigRevisionIds);
	const ids = samples.map((row) => row.id);
	if (ids.length === 0) return [];
	const [disclosures, embargoes] = await Promise.all([
		disclosuresOf(db, ids),
		standingEmbargoesOf(db, ids, now)
	]);
	return samples.map((row) => ({
		...row,
		disclosures: disclosures.filter((one) => one.sampleId === row.id).map((one) => one.disclosure),
		embargoes: embargoes
			.filter((one) => one.sampleId === row.id)
			.map(({ field, until }) => ({ field, until }))
	}));
}

export type SampleDutyRow = Awaited<ReturnType<typeof ofRigRevisions>>[number];
