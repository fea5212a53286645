import { and, asc, count, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import type { PartKind, Provenance } from '../../../domain/stores/words';
import type { Db } from '../client';
import {
	campaign,
	embargo,
	loan,
	loanSample,
	part,
	partner,
	rig,
	rigRevision,
	rigSample,
	sample
} from '../schema';
import { behind, containsWords, idsAmong, ordered, type Way, type Window } from '../search';

export interface SampleFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	provenance?: Provenance;
	kind?: PartKind;
	partIds?: number[];
}

export type SampleSort = 'id' | 'code' | 'part' | 'place' | 'newest';

const sorts = {
	id: [],
	code: [sample.slug],
	part: [part.maker, part.model, sample.slug],
	place: [sample.place, sample.slug],
	newest: [sample.createdAt]
} as const;

const matching = ({ q, provenance, kind, partIds, after }: SampleFilter) =>
	and(
		behind(sample.id, after),
		containsWords(q, [sample.slug, sample.serial, sample.place, part.maker, part.model]),
		provenance === undefined ? undefined : eq(sample.provenance, provenance),
		kind === undefined ? undefined : eq(part.kind, kind),
		partIds === undefined ? undefined : inArray(sample.partId, partIds)
	);

const columns = {
	id: sample.id,
	slug: sample.slug,
	partId: sample.partId,
	serial: sample.serial,
	provenance: sample.provenance,
	condition: sample.condition,
	place: sample.place,
	createdAt: sample.createdAt,
	version: sample.version,
	partSlug: part.slug,
	maker: part.maker,
	model: part.model,
	kind: part.kind
};

export const list = (db: Db, filter: SampleFilter & { sort: SampleSort; way: Way } & Window) =>
	db
		.select(columns)
		.from(sample)
		.innerJoin(part, eq(part.id, sample.partId))
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, sample.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: SampleFilter) =>
	(
		await db
			.select({ n: count() })
			.from(sample)
			.innerJoin(part, eq(part.id, sample.partId))
			.where(matching(filter))
	)[0]?.n ?? 0;

/** Samples by slug or id with their part, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select(columns)
				.from(sample)
				.innerJoin(part, eq(part.id, sample.partId))
				.where(or(inArray(sample.slug, refs), ids.length ? inArray(sample.id, ids) : undefined));
};

/** Samples with a serial number, spaces and case aside, by code. */
export const bySerial = (db: Db, serial: string, limit = 20) =>
	db
		.select(columns)
		.from(sample)
		.innerJoin(part, eq(part.id, sample.partId))
		.where(
			sql`${sample.serial} <> '' and replace(lower(${sample.serial}), ' ', '') = ${serial.toLowerCase().replace(/\s+/g, '')}`
		)
		.orderBy(asc(sample.slug))
		.limit(limit);

/** The samples of several parts, by code. */
export const ofParts = async (db: Db, partIds: number[]) =>
	partIds.length === 0
		? []
		: db
				.select(columns)
				.from(sample)
				.innerJoin(part, eq(part.id, sample.partId))
				.where(inArray(sample.partId, partIds))
				.orderBy(asc(sample.slug));

/** Every sample with its part, in the order of a parts list, to choose from. */
export const choices = (db: Db) =>
	db
		.select(columns)
		.from(sample)
		.innerJoin(part, eq(part.id, sample.partId))
		.orderBy(asc(part.kind), asc(part.maker), asc(part.model), asc(sample.slug));

/** Codes that start with a stem, to find the next free number. */
export const codesLike = async (db: Db, stem: string) =>
	(
		await db
			.select({ slug: sample.slug })
			.from(sample)
			.where(sql`${sample.slug} like ${`${stem}-%`}`)
	).map((row) => row.slug);

/** The rigs that samples are or were in, with the newest revision that has them and the rig's newest. */
export const rigsOf = async (db: Db, sampleIds: number[]) =>
	sampleIds.length === 0
		? []
		: db
				.select({
					sampleId: rigSample.sampleId,
					slug: rig.slug,
					name: rig.name,
					revision: sql<number>`max(${rigRevision.number})`.mapWith(Number),
					newest:
						sql<number>`(select max(newest.number) from rig_revision newest where newest.rig_id = ${rig.id})`.mapWith(
							Number
						)
				})
				.from(rigSample)
				.innerJoin(rigRevision, eq(rigRevision.id, rigSample.rigRevisionId))
				.innerJoin(rig, eq(rig.id, rigRevision.rigId))
				.where(inArray(rigSample.sampleId, sampleIds))
				.groupBy(rigSample.sampleId, rig.id, rig.slug, rig.name)
				.orderBy(asc(rig.name));

/** The campaigns that used samples, through their rigs: names alone. */
export const campaignsOf = async (db: Db, sampleIds: number[]) =>
	sampleIds.length === 0
		? []
		: db
				.selectDistinct({ slug: campaign.slug, name: campaign.name, createdAt: campaign.createdAt })
				.from(rigSample)
				.innerJoin(campaign, eq(campaign.rigRevisionId, rigSample.rigRevisionId))
				.where(inArray(rigSample.sampleId, sampleIds))
				.orderBy(asc(campaign.name));

/** The loans that samples came with, newest first. */
export const loansOf = async (db: Db, sampleIds: number[]) =>
	sampleIds.length === 0
		? []
		: db
				.select({
					sampleId: loanSample.sampleId,
					loanId: loan.id,
					stage: loan.stage,
					dueOn: loan.dueOn,
					disclosure: loan.disclosure,
					partnerName: partner.name,
					partnerSlug: partner.slug
				})
				.from(loanSample)
				.innerJoin(loan, eq(loan.id, loanSample.loanId))
				.innerJoin(partner, eq(partner.id, loan.partnerId))
				.where(inArray(loanSample.sampleId, sampleIds))
				.orderBy(sql`${loan.id} desc`);

/** Embargoes that still stand on samples, the last to lift first. */
export const embargoesOf = async (db: Db, sampleIds: number[]) =>
	sampleIds.length === 0
		? []
		: db
				.select({ sampleId: embargo.sampleId, field: embargo.field, until: embargo.until })
				.from(embargo)
				.where(and(inArray(embargo.sampleId, sampleIds), isNull(embargo.liftedAt)))
				.orderBy(sql`${embargo.until} desc`);

export async function insert(db: Db, row: typeof sample.$inferInsert): Promise<number> {
	const [created] = await db.insert(sample).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the sample.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof sample.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(sample)
		.set({ ...change, version: sql`${sample.version} + 1` })
		.where(and(eq(sample.id, id), eq(sample.version, seen)));
	return result.affectedRows === 1;
}
