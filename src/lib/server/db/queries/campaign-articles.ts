import { asc, eq } from 'drizzle-orm';
import type { Db } from '../client';
import { article, articleCampaign } from '../schema';

/** The articles bound to a campaign, by name. */
export const ofCampaign = (db: Db, campaignId: number) =>
	db
		.select({ slug: article.slug, title: article.title, stage: article.stage })
		.from(articleCampaign)
		.innerJoin(article, eq(article.id, articleCampaign.articleId))
		.where(eq(articleCampaign.campaignId, campaignId))
		.orderBy(asc(article.title), asc(article.id));
