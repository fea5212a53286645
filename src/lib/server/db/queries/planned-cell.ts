import { and, eq } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, campaignProfile, campaignWorkload, profile, workload } from '../schema';

/** One cell of a campaign's plan by the slugs of its row and column; undefined where the plan has none so called. */
export const bySlugs = async (db: Db, campaignRef: string, cell: { profile: string; workload: string }) =>
	(
		await db
			.select({
				campaignId: campaign.id,
				archivedAt: campaign.archivedAt,
				profile: { id: profile.id, slug: profile.slug },
				workload: {
					id: workload.id,
					slug: workload.slug,
					unit: workload.unit,
					needed: campaignWorkload.repeats
				}
			})
			.from(campaign)
			.innerJoin(campaignProfile, eq(campaignProfile.campaignId, campaign.id))
			.innerJoin(profile, and(eq(profile.id, campaignProfile.profileId), eq(profile.slug, cell.profile)))
			.innerJoin(campaignWorkload, eq(campaignWorkload.campaignId, campaign.id))
			.innerJoin(
				workload,
				and(eq(workload.id, campaignWorkload.workloadId), eq(workload.slug, cell.workload))
			)
			.where(
				/^\d{1,9}$/.test(campaignRef) ? eq(campaign.id, Number(campaignRef)) : eq(campaign.slug, campaignRef)
			)
			.limit(1)
	)[0];
