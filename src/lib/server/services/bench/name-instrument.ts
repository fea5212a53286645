import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CampaignInstrument } from '../../../schemas/campaign';
import type { Context } from '../../context';
import * as instruments from '../../db/queries/instrument';
import { changePlan, type PlanChange } from './change-plan';

async function decide(
	ctx: Context,
	campaignId: number,
	row: { id: number; slug: string },
	ref: string
): Promise<Outcome<PlanChange>> {
	const before = (await instruments.ofCampaign(ctx.db, campaignId)).find((one) => one.workloadId === row.id);
	const [found] = ref === '' ? [] : await instruments.byRefs(ctx.db, [ref]);
	if (ref !== '' && !found)
		return refuse('invalid', `There is no instrument “${ref}” in the lab. Nothing was changed.`);
	if (found?.retiredAt && found.slug !== before?.slug)
		return refuse('conflict', `${found.name} is no longer in use. Nothing was changed; name another.`);
	await instruments.setForColumn(ctx.db, campaignId, row.id, found?.id ?? null);
	return done({
		act: 'campaign.instrument',
		before: { workload: row.slug, instrument: before?.slug ?? null },
		after: { workload: row.slug, instrument: found?.slug ?? null }
	});
}

/** Names what the figures of a column are read from, or that the program itself counts them. */
export const nameInstrument = (
	ctx: Context,
	campaignRef: string,
	input: CampaignInstrument
): Promise<Outcome<{ slug: string }>> =>
	changePlan(ctx, campaignRef, input.version, async (tx, plan) => {
		const row = plan.workloads.find((one) => one.slug === input.workload);
		if (!row) return refuse('not_found', 'This campaign has no such workload.');
		return decide(tx, plan.head.id, row, input.instrument);
	});
