import { redirect } from '@sveltejs/kit';
import { blankSweep, sweepPlan } from '$lib/schemas/sweep';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createSweep } from '$lib/server/services/stability/create-sweep';
import { offerStability } from '$lib/server/services/stability/offer-plan';
import type { PageServerLoadEvent, RequestEvent } from './$types';

/** First the rig, then its profiles: two steps, so that it works without scripts. */
export const load = guarded('bench.plan', async ({ url }: PageServerLoadEvent, ctx) => {
	const offer = valueOrError(await offerStability(ctx, url.searchParams.get('rig') ?? ''));
	const blank = blankSweep(offer.rig?.slug ?? '', offer.profiles[0]?.slug ?? '');
	return { title: 'Begin a sweep', offer, form: await blankForm(sweepPlan, blank) };
});

export const actions = {
	default: guarded('bench.plan', async ({ request, url }: RequestEvent, ctx) => {
		const blank = blankSweep(url.searchParams.get('rig') ?? '', '');
		const { form, value } = await readForm(request, sweepPlan, blank);
		if (!value) return refuseForm(form);
		const created = await createSweep(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/bench/sweeps/${created.value.slug}`);
	})
};
