import { and, desc, eq, inArray, isNotNull, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { article, articleCampaign, campaign, rig, rigRevision } from '../schema';

/** Campaigns an article can be bound to, the newest first. */
export const open = (db: Db, limit = 500) =>
	db
		.select({ slug: campaign.slug, name: campaign.name, rigName: rig.name, rigRevision: rigRevision.number })
		.from(campaign)
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.where(isNull(campaign.archivedAt))
		.orderBy(desc(campaign.createdAt), desc(campaign.id))
		.limit(limit);

/** The campaign of the article that was printed last: one whose data are all there; undefined where none was. */
export const lastPrinted = async (db: Db) =>
	(
		await db
			.select({ slug: campaign.slug })
			.from(campaign)
			.innerJoin(articleCampaign, eq(articleCampaign.campaignId, campaign.id))
			.innerJoin(article, eq(article.id, articleCampaign.articleId))
			.where(and(isNull(campaign.archivedAt), isNotNull(article.liveEditionId), isNull(article.withdrawnAt)))
			.orderBy(desc(article.firstPublishedAt), articleCampaign.position)
			.limit(1)
	)[0]?.slug;

/** The ids behind campaign slugs. */
export const idsOf = (db: Db, slugs: string[]) =>
	slugs.length === 0
		? Promise.resolve([])
		: db.select({ id: campaign.id, slug: campaign.slug }).from(campaign).where(inArray(campaign.slug, slugs));
