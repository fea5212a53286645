import { and, asc, desc, eq, exists, gte, inArray, isNull, lt, sql, type SQL } from 'drizzle-orm';
import type { Stage } from '../../../domain/articles/stage';
import type { Db } from '../client';
import { article, articleCampaign, articleTag, articleText, campaign, user, userRole } from '../schema';

export interface ArticleFilter {
	stage?: Stage;
	writer?: string;
	campaign?: string;
	tag?: string;
	/** Last change, from and before. */
	from?: Date;
	before?: Date;
	/** For MariaDB’s boolean mode. */
	words?: string;
	/** Part of a title, where words cannot be looked for. */
	title?: string;
}

const matches = (words: string): SQL =>
	sql`match(${articleText.title}, ${articleText.standfirst}, ${articleText.source}) against (${words} in boolean mode)`;

function matching(db: Db, filter: ArticleFilter): SQL | undefined {
	const bound = (slug: string) =>
		exists(
			db
				.select({ one: sql`1` })
				.from(articleCampaign)
				.innerJoin(campaign, eq(campaign.id, articleCampaign.campaignId))
				.where(and(eq(articleCampaign.articleId, article.id), eq(campaign.slug, slug)))
		);
	const tagged = (tag: string) =>
		exists(
			db
				.select({ one: sql`1` })
				.from(articleTag)
				.where(and(eq(articleTag.articleId, article.id), eq(articleTag.tag, tag)))
		);
	return and(
		filter.stage && eq(article.stage, filter.stage),
		filter.writer ? eq(article.authorId, filter.writer) : undefined,
		filter.campaign ? bound(filter.campaign) : undefined,
		filter.tag ? tagged(filter.tag) : undefined,
		filter.from && gte(article.updatedAt, filter.from),
		filter.before && lt(article.updatedAt, filter.before),
		filter.words ? matches(filter.words) : undefined,
		filter.title ? sql`${article.title} like ${`%${filter.title.replace(/[\\%_]/g, '\\$&')}%`}` : undefined
	);
}

const sortColumns = {
	changed: article.updatedAt,
	title: article.title,
	writer: user.name,
	slot: article.slotAt,
	printed: article.firstPublishedAt
} as const;

export interface ListOrder {
	sort: keyof typeof sortColumns;
	way: 'up' | 'down';
	limit: number;
	offset: number;
}

/** One page of all articles, whatever their stage. */
export const list = (db: Db, filter: ArticleFilter, { sort, way, limit, offset }: ListOrder) =>
	db
		.select({
			id: article.id,
			slug: article.slug,
			title: article.title,
			stage: article.stage,
			authorId: article.authorId,
			authorName: user.name,
			slotAt: article.slotAt,
			updatedAt: article.updatedAt,
			firstPublishedAt: article.firstPublishedAt
		})
		.from(article)
		.innerJoin(user, eq(user.id, article.authorId))
		.innerJoin(articleText, eq(articleText.articleId, article.id))
		.where(matching(db, filter))
		// What has no slot or was never printed comes last either way.
		.orderBy(
			sql`${sortColumns[sort]} is null`,
			(way === 'up' ? asc : desc)(sortColumns[sort]),
			desc(article.id)
		)
		.limit(limit)
		.offset(offset);

export const total = async (db: Db, filter: ArticleFilter): Promise<number> =>
	(
		await db
			.select({ n: sql<number>`count(*)`.mapWith(Number) })
			.from(article)
			.innerJoin(articleText, eq(articleText.articleId, article.id))
			.where(matching(db, filter))
	)[0]?.n ?? 0;

/** The newest texts of several articles. */
export const textsOf = (db: Db, articleIds: number[]) =>
	articleIds.length === 0
		? Promise.resolve([])
		: db.select().from(articleText).where(inArray(articleText.articleId, articleIds));

/** The tags of several articles. */
export const tagsOf = (db: Db, articleIds: number[]) =>
	articleIds.length === 0
		? Promise.resolve([])
		: db.select().from(articleTag).where(inArray(articleTag.articleId, articleIds)).orderBy(articleTag.tag);

/** Every tag in use with how many articles carry it. */
export const tagCounts = (db: Db) =>
	db
		.select({ tag: articleTag.tag, articles: sql<number>`count(*)`.mapWith(Number) })
		.from(articleTag)
		.groupBy(articleTag.tag)
		.orderBy(articleTag.tag);

/** The campaigns that any article is bound to. */
export const boundCampaigns = (db: Db) =>
	db
		.selectDistinct({ slug: campaign.slug, name: campaign.name })
		.from(articleCampaign)
		.innerJoin(campaign, eq(campaign.id, articleCampaign.campaignId))
		.orderBy(campaign.name);

/** Who has written any article. */
export const writers = (db: Db) =>
	db
		.selectDistinct({ id: user.id, name: user.name })
		.from(article)
		.innerJoin(user, eq(user.id, article.authorId))
		.orderBy(user.name);

/** Who can be given an article to write: those at their desks who write or edit. */
export const canWrite = (db: Db) =>
	db
		.selectDistinct({ id: user.id, name: user.name, email: user.email })
		.from(user)
		.innerJoin(userRole, eq(userRole.userId, user.id))
		.where(and(isNull(user.leftAt), inArray(userRole.role, ['writer', 'editor'])))
		.orderBy(user.name);
