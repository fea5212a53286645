import { and, asc, count, desc, eq, inArray, isNull, like, notInArray, sql, type SQL } from 'drizzle-orm';
import type { Stage } from '../../../domain/articles/stage';
import type { Db } from '../client';
import {
	article,
	articleCampaign,
	campaign,
	comment,
	embargo,
	part,
	rigSample,
	sample,
	user
} from '../schema';

/** Stages in which there is nothing left to do on the desk. */
const rested: Stage[] = ['published', 'withdrawn'];

export interface DeskListFilter {
	/** One stage, or everything in progress. */
	stage: Stage | null;
	authorId?: string;
	/** Part of a title. */
	text?: string;
	sort: 'slot' | 'title' | 'writer' | 'changed';
}

function matching({ stage, authorId, text }: DeskListFilter): SQL | undefined {
	return and(
		stage ? eq(article.stage, stage) : notInArray(article.stage, rested),
		authorId ? eq(article.authorId, authorId) : undefined,
		text ? like(article.title, `%${text.replace(/[\\%_]/g, '\\$&')}%`) : undefined
	);
}

const orders = {
	// Those without a slot come after those with one.
	slot: [asc(sql`${article.slotAt} is null`), asc(article.slotAt), desc(article.updatedAt)],
	title: [asc(article.title)],
	writer: [asc(user.name), asc(article.title)],
	changed: [desc(article.updatedAt)]
} satisfies Record<DeskListFilter['sort'], SQL[]>;

const columns = {
	id: article.id,
	slug: article.slug,
	title: article.title,
	stage: article.stage,
	slotAt: article.slotAt,
	updatedAt: article.updatedAt,
	firstPublishedAt: article.firstPublishedAt,
	authorId: article.authorId,
	authorName: user.name
};

/** One page of the desk's list, with all that match counted. */
export async function list(db: Db, filter: DeskListFilter, page: { limit: number; offset: number }) {
	const where = matching(filter);
	const [rows, [total]] = await Promise.all([
		db
			.select(columns)
			.from(article)
			.innerJoin(user, eq(user.id, article.authorId))
			.where(where)
			.orderBy(...orders[filter.sort], asc(article.id))
			.limit(page.limit)
			.offset(page.offset),
		db.select({ n: count() }).from(article).where(where)
	]);
	return { rows, total: total?.n ?? 0 };
}

export type DeskRow = Awaited<ReturnType<typeof list>>['rows'][number];

/** The campaigns of several articles. */
export const campaignsOf = (db: Db, articleIds: number[]) =>
	articleIds.length === 0
		? Promise.resolve([])
		: db
				.select({ articleId: articleCampaign.articleId, campaignId: articleCampaign.campaignId })
				.from(articleCampaign)
				.where(inArray(articleCampaign.articleId, articleIds));

/** How many blocking comments stand on each of several articles; articles without one are left out. */
export const openBlocksOf = (db: Db, articleIds: number[]) =>
	articleIds.length === 0
		? Promise.resolve([])
		: db
				.select({ articleId: comment.articleId, blocks: count() })
				.from(comment)
				.where(
					and(
						inArray(comment.articleId, articleIds),
						eq(comment.blocking, true),
						isNull(comment.resolvedAt),
						isNull(comment.parentId)
					)
				)
				.groupBy(comment.articleId);

/** The last embargo that stands on samples behind each of several articles, and on what. */
export const embargoesOf = (db: Db, articleIds: number[], now: Date) =>
	articleIds.length === 0
		? Promise.resolve([])
		: db
				.select({
					articleId: articleCampaign.articleId,
					until: sql<Date>`max(${embargo.until})`.mapWith(embargo.until),
					partName: sql<string>`min(concat(${part.maker}, ' ', ${part.model}))`
				})
				.from(articleCampaign)
				.innerJoin(campaign, eq(campaign.id, articleCampaign.campaignId))
				.innerJoin(rigSample, eq(rigSample.rigRevisionId, campaign.rigRevisionId))
				.innerJoin(
					embargo,
					and(
						eq(embargo.sampleId, rigSample.sampleId),
						isNull(embargo.liftedAt),
						sql`${embargo.until} > ${now}`
					)
				)
				.innerJoin(sample, eq(sample.id, rigSample.sampleId))
				.innerJoin(part, eq(part.id, sample.partId))
				.where(inArray(articleCampaign.articleId, articleIds))
				.groupBy(articleCampaign.articleId);
