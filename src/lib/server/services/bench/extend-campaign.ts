import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CampaignExtend, CampaignRepeats, CampaignTrim } from '../../../schemas/campaign';
import type { Context } from '../../context';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as plans from '../../db/queries/campaign-plan';
import { changePlan, type PlanChange } from './change-plan';
import { chooseRows } from './choose-plan';

async function extend(ctx: Context, plan: CampaignPlan, input: CampaignExtend): Promise<Outcome<PlanChange>> {
	const rows = await chooseRows(ctx.db, plan.head.rigId, input);
	if (!rows.ok) return rows;
	const has = {
		profiles: plan.profiles.map((row) => row.id),
		workloads: plan.workloads.map((row) => row.id)
	};
	const profileIds = rows.value.profileIds.filter((id) => !has.profiles.includes(id));
	const workloads = rows.value.workloads.filter((row) => !has.workloads.includes(row.workloadId));
	if (profileIds.length + workloads.length === 0)
		return refuse('invalid', 'Choose a profile or a workload that is not in the campaign yet.');
	await plans.addProfiles(ctx.db, plan.head.id, profileIds, await plans.nextPosition(ctx.db, plan.head.id));
	await plans.addWorkloads(ctx.db, plan.head.id, workloads, await plans.nextPosition(ctx.db, plan.head.id));
	return done({
		act: 'campaign.extend',
		before: {
			profiles: plan.profiles.map((row) => row.slug),
			workloads: plan.workloads.map((row) => row.slug)
		},
		after: { profiles: input.profiles, workloads: input.workloads.map((row) => row.workload) }
	});
}

/** Adds profiles and workloads to a campaign, at the end of its rows and columns. */
export const extendCampaign = (
	ctx: Context,
	campaignRef: string,
	input: CampaignExtend
): Promise<Outcome<{ slug: string }>> =>
	changePlan(ctx, campaignRef, input.version, (tx, plan) => extend(tx, plan, input));

async function trim(ctx: Context, plan: CampaignPlan, input: CampaignTrim): Promise<Outcome<PlanChange>> {
	const rows = input.kind === 'profile' ? plan.profiles : plan.workloads;
	const row = rows.find((one) => one.slug === input.ref || String(one.id) === input.ref);
	if (!row) return refuse('not_found', `This campaign has no such ${input.kind}.`);
	if (rows.length === 1)
		return refuse('invalid', `${row.name} is the campaign's last ${input.kind}. Nothing was removed.`);
	const campaignId = plan.head.id;
	const id = row.id;
	const where = input.kind === 'profile' ? { profileId: id } : { workloadId: id };
	await plans.lockPart(ctx.db, campaignId, where);
	if (await plans.isUsed(ctx.db, campaignId, where))
		return refuse(
			'conflict',
			`${row.name} has runs in this campaign, so it stays: what was measured is never removed. Void the runs if they must not count.`
		);
	if (input.kind === 'profile') await plans.removeProfile(ctx.db, campaignId, id);
	else await plans.removeWorkload(ctx.db, campaignId, id);
	return done({
		act: 'campaign.trim',
		before: { [`${input.kind}s`]: rows.map((one) => one.slug) },
		after: { [`${input.kind}s`]: rows.filter((one) => one !== row).map((one) => one.slug) }
	});
}

/** Takes a profile or workload out of a campaign while it has no runs there. */
export const trimCampaign = (
	ctx: Context,
	campaignRef: string,
	input: CampaignTrim
): Promise<Outcome<{ slug: string }>> =>
	changePlan(ctx, campaignRef, input.version, (tx, plan) => trim(tx, plan, input));

/** Changes how many readings each cell of a column needs. */
export const setRepeats = (
	ctx: Context,
	campaignRef: string,
	input: CampaignRepeats
): Promise<Outcome<{ slug: string }>> =>
	changePlan(ctx, campaignRef, input.version, async (tx, plan) => {
		const row = plan.workloads.find((one) => one.slug === input.workload);
		if (!row) return refuse('not_found', 'This campaign has no such workload.');
		await plans.setRepeats(tx.db, plan.head.id, row.id, input.repeats);
		return done({
			act: 'campaign.repeats',
			before: { workload: row.slug, repeats: row.needed },
			after: { workload: row.slug, repeats: input.repeats }
		});
	});
