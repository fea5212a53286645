import { and, desc, eq, exists, inArray, isNotNull, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, cellSignature, rig, rigRevision } from '../schema';

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

/** The newest open campaign with a cell that is signed off; undefined where there is none. */
export const newestSigned = async (db: Db) =>
	(
		await db
			.select({ slug: campaign.slug })
			.from(campaign)
			.where(
				and(
					isNull(campaign.archivedAt),
					exists(
						db
							.select({ id: cellSignature.id })
							.from(cellSignature)
							.where(and(eq(cellSignature.campaignId, campaign.id), isNotNull(cellSignature.standing)))
					)
				)
			)
			.orderBy(desc(campaign.createdAt), desc(campaign.id))
			.limit(1)
	)[0]?.slug;

/** The ids behind campaign slugs. */
export const idsOf = (db: Db, slugs: string[]) =>
	slugs.length === 0
		? Promise.resolve([])
		: db.select({ id: campaign.id, slug: campaign.slug }).from(campaign).where(inArray(campaign.slug, slugs));
