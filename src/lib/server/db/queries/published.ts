import { and, asc, count, desc, eq, inArray, isNotNull, isNull, max, type SQL } from 'drizzle-orm';
import type { Db } from '../client';
import {
	article,
	correction,
	edition,
	editionPart,
	editionResult,
	part,
	partPrice,
	plate,
	workload
} from '../schema';

/**
 * Readers have a page of it: a live edition that was not withdrawn, whatever the desk does to the next one meanwhile.
 */
const published: SQL | undefined = and(isNotNull(article.liveEditionId), isNull(article.withdrawnAt));

/** Every query here sees live editions alone: joined on `live_edition_id`, never drafts, never what only waits. */
const live = eq(article.liveEditionId, edition.id);

const card = {
	slug: article.slug,
	title: edition.title,
	standfirst: edition.standfirst,
	template: article.template,
	authorName: edition.authorName,
	testerNames: edition.testerNames,
	editionNumber: edition.number,
	firstPublishedAt: article.firstPublishedAt,
	publishedAt: edition.publishedAt
};

/** Published articles, the newest first. */
export const articles = (
	db: Db,
	{ limit, offset, template }: { limit: number; offset: number; template?: string }
) =>
	db
		.select(card)
		.from(article)
		.innerJoin(edition, live)
		.where(and(published, template ? eq(article.template, template) : undefined))
		.orderBy(desc(article.firstPublishedAt))
		.limit(limit)
		.offset(offset);

export const countArticles = async (db: Db, template?: string): Promise<number> =>
	(
		await db
			.select({ n: count() })
			.from(article)
			.where(and(published, template ? eq(article.template, template) : undefined))
	)[0]?.n ?? 0;

/** An article readers can reach, with the page of its live edition; also when it was withdrawn. */
export const bySlug = async (db: Db, slug: string) =>
	(
		await db
			.select({
				...card,
				id: article.id,
				stage: article.stage,
				withdrawnAt: article.withdrawnAt,
				withdrawReason: article.withdrawReason,
				editionId: edition.id,
				page: edition.page,
				hash: edition.hash
			})
			.from(article)
			.innerJoin(edition, live)
			.where(eq(article.slug, slug))
			.limit(1)
	)[0];

/** The editions of an article that went out, the newest first. */
export const editionsOf = (db: Db, articleId: number) =>
	db
		.select({ number: edition.number, publishedAt: edition.publishedAt, hash: edition.hash })
		.from(edition)
		.where(and(eq(edition.articleId, articleId), isNotNull(edition.publishedAt)))
		.orderBy(desc(edition.number));

/** Corrections of one article, or of all, the newest first. */
export const corrections = (db: Db, where: { articleId?: number; limit: number }) =>
	db
		.select({
			id: correction.id,
			kind: correction.kind,
			body: correction.body,
			madeAt: correction.madeAt,
			slug: article.slug,
			title: article.title
		})
		.from(correction)
		.innerJoin(article, eq(article.id, correction.articleId))
		.where(where.articleId === undefined ? undefined : eq(correction.articleId, where.articleId))
		.orderBy(desc(correction.madeAt), desc(correction.id))
		.limit(where.limit);

/** One plate of the live edition. */
export const plateOf = async (db: Db, slug: string, key: string) =>
	(
		await db
			.select({
				svg: plate.svg,
				csv: plate.csv,
				title: plate.title,
				withdrawnAt: article.withdrawnAt,
				hash: edition.hash
			})
			.from(article)
			.innerJoin(edition, live)
			.innerJoin(plate, eq(plate.editionId, edition.id))
			.where(and(eq(article.slug, slug), eq(plate.key, key)))
			.limit(1)
	)[0];

/** Parts that live editions have results of, with how many articles. */
export const parts = (db: Db) =>
	db
		.select({
			slug: part.slug,
			kind: part.kind,
			maker: part.maker,
			model: part.model,
			articles: count(article.id),
			latest: max(article.firstPublishedAt)
		})
		.from(part)
		.innerJoin(editionPart, eq(editionPart.partId, part.id))
		.innerJoin(edition, eq(edition.id, editionPart.editionId))
		.innerJoin(article, live)
		.where(published)
		.groupBy(part.id)
		.orderBy(asc(part.kind), asc(part.maker), asc(part.model));

/** A part, if a live edition has results of it. */
export const partBySlug = async (db: Db, slug: string) =>
	(
		await db
			.selectDistinct({
				id: part.id,
				slug: part.slug,
				kind: part.kind,
				maker: part.maker,
				model: part.model,
				specification: part.specification
			})
			.from(part)
			.innerJoin(editionPart, eq(editionPart.partId, part.id))
			.innerJoin(edition, eq(edition.id, editionPart.editionId))
			.innerJoin(article, live)
			.where(and(eq(part.slug, slug), published))
			.limit(1)
	)[0];

export const pricesOf = (db: Db, partId: number) =>
	db
		.select({
			amountMinor: partPrice.amountMinor,
			currency: partPrice.currency,
			observedOn: partPrice.observedOn
		})
		.from(partPrice)
		.where(eq(partPrice.partId, partId))
		.orderBy(desc(partPrice.observedOn), desc(partPrice.id));

export const articlesOfPart = (db: Db, partId: number) =>
	db
		.select(card)
		.from(article)
		.innerJoin(edition, live)
		.innerJoin(editionPart, eq(editionPart.editionId, edition.id))
		.where(and(eq(editionPart.partId, partId), published))
		.orderBy(desc(article.firstPublishedAt));

const resultColumns = {
	articleSlug: article.slug,
	articleTitle: edition.title,
	publishedAt: edition.publishedAt,
	rigName: editionResult.rigName,
	rigRevision: editionResult.rigRevision,
	campaignSlug: editionResult.campaignSlug,
	profileSlug: editionResult.profileSlug,
	profileName: editionResult.profileName,
	workloadSlug: editionResult.workloadSlug,
	workloadName: editionResult.workloadName,
	unit: editionResult.unit,
	better: editionResult.better,
	figures: editionResult.figures
};

/** Published figures of the editions that have a part. */
export const resultsOfPart = (db: Db, partId: number) =>
	db
		.select(resultColumns)
		.from(editionResult)
		.innerJoin(edition, eq(edition.id, editionResult.editionId))
		.innerJoin(article, live)
		.innerJoin(editionPart, and(eq(editionPart.editionId, edition.id), eq(editionPart.partId, partId)))
		.where(published)
		.orderBy(asc(editionResult.workloadName), asc(editionResult.id));

/** Published figures of a workload. */
export const resultsOfWorkload = (db: Db, slug: string) =>
	db
		.select(resultColumns)
		.from(editionResult)
		.innerJoin(edition, eq(edition.id, editionResult.editionId))
		.innerJoin(article, live)
		.where(and(eq(editionResult.workloadSlug, slug), published))
		.orderBy(desc(edition.publishedAt), asc(editionResult.id));

/** Workloads that have published results: the method pages. */
export async function methods(db: Db) {
	const used = await db
		.select({ slug: editionResult.workloadSlug, results: count(), articles: count(article.id) })
		.from(editionResult)
		.innerJoin(edition, eq(edition.id, editionResult.editionId))
		.innerJoin(article, live)
		.where(published)
		.groupBy(editionResult.workloadSlug);
	if (used.length === 0) return [];
	return db
		.select({
			slug: workload.slug,
			name: workload.name,
			class: workload.class,
			quantity: workload.quantity,
			unit: workload.unit,
			better: workload.better,
			programVersion: workload.programVersion
		})
		.from(workload)
		.where(
			inArray(
				workload.slug,
				used.map((u) => u.slug)
			)
		)
		.orderBy(asc(workload.class), asc(workload.name));
}

export const workloadBySlug = async (db: Db, slug: string) =>
	(await db.select().from(workload).where(eq(workload.slug, slug)).limit(1))[0];
