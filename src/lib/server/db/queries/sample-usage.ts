import { asc, eq, inArray } from 'drizzle-orm';
import type { Db } from '../client';
import { article, articleCampaign, campaign, rigSample, user } from '../schema';

/** Which articles use which samples, through their campaigns' rigs: title, stage and slot, and nothing of what they say. */
export const articlesOf = (db: Db, sampleIds: number[]) =>
	sampleIds.length === 0
		? Promise.resolve([])
		: db
				.selectDistinct({
					sampleId: rigSample.sampleId,
					articleId: article.id,
					slug: article.slug,
					title: article.title,
					stage: article.stage,
					slotAt: article.slotAt,
					firstPublishedAt: article.firstPublishedAt,
					authorName: user.name
				})
				.from(rigSample)
				.innerJoin(campaign, eq(campaign.rigRevisionId, rigSample.rigRevisionId))
				.innerJoin(articleCampaign, eq(articleCampaign.campaignId, campaign.id))
				.innerJoin(article, eq(article.id, articleCampaign.articleId))
				.innerJoin(user, eq(user.id, article.authorId))
				.where(inArray(rigSample.sampleId, sampleIds))
				.orderBy(asc(article.title));
