import { desc, eq, inArray, isNull } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, rig, rigRevision } from '../schema';

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

/** The ids behind campaign slugs. */
export const idsOf = (db: Db, slugs: string[]) =>
	slugs.length === 0
		? Promise.resolve([])
		: db.select({ id: campaign.id, slug: campaign.slug }).from(campaign).where(inArray(campaign.slug, slugs));
