import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { firstOf } from '../../../domain/shared/first-of';
import type { Context } from '../../context';
import * as campaigns from '../../db/queries/campaign';
import * as facts from '../../db/queries/campaign-facts';
import * as workloads from '../../db/queries/campaign-plan';

export interface SuiteOffer {
	/** Those of the campaign first, in its order. */
	workloads: Awaited<ReturnType<typeof workloads.workloadChoices>>;
	/** The campaign that the suite is saved from. */
	from: {
		slug: string;
		name: string;
		purpose: string;
		workloads: { slug: string; repeats: number }[];
	} | null;
}

async function fromCampaign(ctx: Context, ref: string): Promise<SuiteOffer['from']> {
	const id = ref === '' ? undefined : await campaigns.idOf(ctx.db, ref);
	const [plan] = id === undefined ? [] : await facts.plansOf(ctx.db, [id]);
	if (!plan) return null;
	const { slug, name } = plan.head;
	const chosen = plan.workloads.map((row) => ({ slug: row.slug, repeats: row.needed }));
	return { slug, name, purpose: '', workloads: chosen };
}

/** What a suite can be made of; with a campaign named, what that one measures. */
export async function offerSuite(
	ctx: Context,
	campaignRef: string
): Promise<Outcome<SuiteOffer, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers put suites together.');
	const [offered, from] = await Promise.all([
		workloads.workloadChoices(ctx.db),
		fromCampaign(ctx, campaignRef)
	]);
	if (campaignRef !== '' && !from) return refuse('not_found', 'There is no such campaign.');
	const slugs = from?.workloads.map((row) => row.slug) ?? [];
	return done({ workloads: firstOf(offered, slugs), from });
}
