import { and, asc, count, desc, eq, gte, inArray, isNull, ne, notInArray, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import {
	article,
	articleCampaign,
	campaign,
	campaignWorkload,
	cellSignature,
	comment,
	reading,
	run,
	user
} from '../schema';

const most = 30;

const card = {
	id: article.id,
	slug: article.slug,
	title: article.title,
	stage: article.stage,
	slotAt: article.slotAt,
	updatedAt: article.updatedAt,
	authorName: user.name
};

/** Articles in review that somebody else wrote, and approved ones that have no slot: what an editor can act on. */
export const forEditor = (db: Db, editorId: string) =>
	db
		.select(card)
		.from(article)
		.innerJoin(user, eq(user.id, article.authorId))
		.where(
			or(and(eq(article.stage, 'in-review'), ne(article.authorId, editorId)), eq(article.stage, 'approved'))
		)
		.orderBy(asc(sql`coalesce(${article.slotAt}, ${article.updatedAt})`))
		.limit(most);

/** A person's own articles with changes asked, and those on which comments of others wait for an answer. */
export const forAuthor = (db: Db, authorId: string) =>
	db
		.select({ ...card, comments: count(comment.id) })
		.from(article)
		.innerJoin(user, eq(user.id, article.authorId))
		.leftJoin(
			comment,
			and(
				eq(comment.articleId, article.id),
				isNull(comment.resolvedAt),
				isNull(comment.parentId),
				ne(comment.authorId, authorId)
			)
		)
		.where(and(eq(article.authorId, authorId), notInArray(article.stage, ['published', 'withdrawn'])))
		.groupBy(article.id)
		.having(sql`${article.stage} = 'changes-asked' or count(${comment.id}) > 0`)
		.orderBy(asc(sql`coalesce(${article.slotAt}, ${article.updatedAt})`))
		.limit(most);

/** Campaigns a tester may owe signatures: those behind articles in progress, and those they measured for since a day. */
async function candidates(db: Db, testerId: string, since: Date): Promise<number[]> {
	const [bound, measured] = await Promise.all([
		db
			.selectDistinct({ id: articleCampaign.campaignId })
			.from(articleCampaign)
			.innerJoin(article, eq(article.id, articleCampaign.articleId))
			.where(notInArray(article.stage, ['published', 'withdrawn']))
			.orderBy(desc(articleCampaign.campaignId))
			.limit(most),
		db
			.selectDistinct({ id: run.campaignId })
			.from(run)
			.where(and(eq(run.testerId, testerId), gte(run.createdAt, since)))
			.orderBy(desc(run.campaignId))
			.limit(most)
	]);
	return [...new Set([...bound, ...measured].map((one) => one.id))];
}

/** Campaigns with cells that have all their readings and no signature, and how many such cells. */
export async function forTester(db: Db, testerId: string, since: Date) {
	const ids = await candidates(db, testerId, since);
	if (ids.length === 0) return [];
	const cells = db
		.select({ campaignId: run.campaignId, latest: sql<Date>`max(${run.createdAt})`.as('latest') })
		.from(run)
		.innerJoin(
			campaignWorkload,
			and(eq(campaignWorkload.campaignId, run.campaignId), eq(campaignWorkload.workloadId, run.workloadId))
		)
		.innerJoin(reading, and(eq(reading.runId, run.id), isNull(reading.excludedAt)))
		.leftJoin(
			cellSignature,
			and(
				eq(cellSignature.campaignId, run.campaignId),
				eq(cellSignature.profileId, run.profileId),
				eq(cellSignature.workloadId, run.workloadId),
				isNull(cellSignature.removedAt)
			)
		)
		.where(and(inArray(run.campaignId, ids), isNull(run.voidedAt), isNull(cellSignature.id)))
		.groupBy(run.campaignId, run.profileId, run.workloadId, campaignWorkload.repeats)
		.having(sql`count(${reading.id}) >= ${campaignWorkload.repeats}`)
		.as('cells');
	return db
		.select({
			slug: campaign.slug,
			name: campaign.name,
			dueAt: campaign.dueAt,
			cells: count(),
			latest: sql<Date>`max(${cells.latest})`.mapWith(run.createdAt)
		})
		.from(cells)
		.innerJoin(campaign, eq(campaign.id, cells.campaignId))
		.where(isNull(campaign.archivedAt))
		.groupBy(campaign.id)
		.orderBy(asc(sql`coalesce(${campaign.dueAt}, max(${cells.latest}))`));
}
