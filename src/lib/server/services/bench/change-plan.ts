import { may } from '../../../domain/people/policy';
import { refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as campaigns from '../../db/queries/campaign';
import type { CampaignPlan } from '../../db/queries/campaign-facts';
import * as facts from '../../db/queries/campaign-facts';
import { findCampaign, findOpenCampaign } from './find-campaign';

/** What a change of the plan did, for the history. */
export interface PlanChange {
	act: string;
	before: unknown;
	after: unknown;
	/** Columns of the campaign's own row that change with it. */
	row?: Parameters<typeof campaigns.update>[3];
}

const overtaken = () =>
	refuse(
		'conflict',
		'Somebody else changed this campaign meanwhile. Nothing was changed; look at theirs, then say yours again.'
	);

/**
 * Changes a campaign's plan under a lock on the campaign, over the version the person saw, with its entry in the history.
 * The change is decided on the plan as it is read under the lock.
 */
export async function changePlan(
	ctx: Context,
	campaignRef: string,
	version: number,
	decide: (ctx: Context, plan: CampaignPlan) => Promise<Outcome<PlanChange>>,
	options: { archivedToo?: boolean } = {}
): Promise<Outcome<{ slug: string }>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only a tester changes the plan.');
	const found = await (options.archivedToo ? findCampaign : findOpenCampaign)(ctx, campaignRef);
	if (!found.ok) return found;
	const { id, slug } = found.value.head;
	return inTransaction(ctx.db, async (db): Promise<Outcome<{ slug: string }>> => {
		const tx = { ...ctx, db };
		const locked = await campaigns.lock(db, id);
		if (locked?.version !== version) return overtaken();
		const [plan] = await facts.plansOf(db, [id]);
		if (!plan) return overtaken();
		const change = await decide(tx, plan);
		if (!change.ok) return change;
		await campaigns.update(db, id, version, change.value.row ?? {});
		await audit.append(db, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: change.value.act,
				subjectKind: 'campaign',
				subjectId: id,
				before: change.value.before,
				after: change.value.after
			}
		]);
		return { ok: true, value: { slug } };
	});
}
