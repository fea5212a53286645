import { redirect } from '@sveltejs/kit';
import { blankLadder, ladderInput } from '$lib/schemas/ladder';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createLadder } from '$lib/server/services/stability/create-ladder';
import { offerStability } from '$lib/server/services/stability/offer-plan';
import type { PageServerLoadEvent, RequestEvent } from './$types';

/** First the rig, then its profiles: two steps, so that it works without scripts. */
export const load = guarded('bench.plan', async ({ url }: PageServerLoadEvent, ctx) => {
	const offer = valueOrError(await offerStability(ctx, url.searchParams.get('rig') ?? ''));
	const blank = blankLadder(offer.rig?.slug ?? '', offer.profiles[0]?.slug ?? '');
	return { title: 'Begin a ladder', offer, form: await blankForm(ladderInput, blank) };
});

export const actions = {
	default: guarded('bench.plan', async ({ request, url }: RequestEvent, ctx) => {
		const blank = { ...blankLadder(url.searchParams.get('rig') ?? '', ''), stresses: [] };
		const { form, value } = await readForm(request, ladderInput, blank);
		if (!value) return refuseForm(form);
		const created = await createLadder(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/bench/ladders/${created.value.slug}`);
	})
};
