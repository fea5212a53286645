import { campaignState, type CampaignState } from '../../../domain/bench/campaign-state';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as progress from '../../db/queries/campaign-progress';
import { findCampaign } from './find-campaign';

export interface DescribedCampaign {
	id: number;
	slug: string;
	name: string;
	purpose: string;
	dueAt: Date | null;
	createdAt: Date;
	state: CampaignState;
	rig: { slug: string; name: string; revision: number; firmware: string; driver: string; os: string };
	profiles: { slug: string; name: string }[];
	workloads: { slug: string; name: string; unit: string; needed: number }[];
	progress: { taken: number; needed: number; cells: number; signed: number };
}

/** A campaign's plan and how far it is, as the API tells it. */
export async function describeCampaign(
	ctx: Context,
	campaignRef: string
): Promise<Outcome<DescribedCampaign>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const found = await findCampaign(ctx, campaignRef);
	if (!found.ok) return found;
	const { head, profiles, workloads } = found.value;
	const far = (await progress.ofCampaigns(ctx.db, [head.id])).get(head.id);
	const cells = profiles.length * workloads.length;
	const signed = far?.signed ?? 0;
	const archived = head.archivedAt !== null;
	return done({
		id: head.id,
		slug: head.slug,
		name: head.name,
		purpose: head.purpose,
		dueAt: head.dueAt,
		createdAt: head.createdAt,
		state: campaignState({ archived, runs: far?.runs ?? 0, cells, signed }),
		rig: {
			slug: head.rigSlug,
			name: head.rigName,
			revision: head.revision,
			firmware: head.firmware,
			driver: head.driver,
			os: head.os
		},
		profiles: profiles.map(({ slug, name }) => ({ slug, name })),
		workloads: workloads.map(({ slug, name, unit, needed }) => ({ slug, name, unit, needed })),
		progress: { taken: far?.taken ?? 0, needed: far?.needed ?? 0, cells, signed }
	});
}
