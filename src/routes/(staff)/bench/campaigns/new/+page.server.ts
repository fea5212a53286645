import { redirect } from '@sveltejs/kit';
import { blankCampaign, campaignInput } from '$lib/schemas/campaign';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { offerPlan } from '$lib/server/services/bench/offer-plan';
import { planCampaign } from '$lib/server/services/bench/plan-campaign';
import type { PageServerLoadEvent, RequestEvent } from './$types';

/** First the rig, then its profiles and the workloads: two steps, so that it works without scripts. */
export const load = guarded('bench.plan', async ({ url }: PageServerLoadEvent, ctx) => {
	const asked = (name: string) => url.searchParams.get(name)?.slice(0, 80) ?? '';
	const offer = valueOrError(
		await offerPlan(ctx, { rig: asked('rig'), from: asked('from'), suite: asked('suite') })
	);
	const chosen = offer.rig?.slug ?? '';
	const blank = blankCampaign(chosen, offer.profiles, offer.workloads, offer.begin);
	return { title: 'Plan a campaign', offer, form: await blankForm(campaignInput, blank) };
});

export const actions = {
	default: guarded('bench.plan', async ({ request, url }: RequestEvent, ctx) => {
		const blank = blankCampaign(url.searchParams.get('rig') ?? '', [], []);
		const { form, value } = await readForm(request, campaignInput, blank);
		if (!value) return refuseForm(form);
		const planned = await planCampaign(ctx, value);
		if (!planned.ok) return refusedForm(form, planned);
		redirect(303, `/bench/campaigns/${planned.value.slug}`);
	})
};
