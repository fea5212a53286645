import { redirect } from '@sveltejs/kit';
import { may } from '$lib/domain/people/policy';
import { blankPrice, priceInput } from '$lib/schemas/part';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { addPartPrice } from '$lib/server/services/stores/add-part-price';
import { offerPrice } from '$lib/server/services/stores/offer-price';
import { showPart } from '$lib/server/services/stores/show-part';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('stores.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const [shown, offered] = await Promise.all([showPart(ctx, params.slug), offerPrice(ctx)]);
	const page = valueOrError(shown);
	const { today, currency } = valueOrError(offered);
	return {
		title: `${page.part.maker} ${page.part.model}`,
		...page,
		form: await blankForm(priceInput, blankPrice(today, page.prices[0]?.currency ?? currency), 'price'),
		edits: may(ctx.actor, 'stores.edit'),
		readsBench: may(ctx.actor, 'bench.read')
	};
});

export const actions = {
	price: guarded('stores.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, priceInput, blankPrice('', ''), 'price');
		if (!value) return refuseForm(form);
		const added = await addPartPrice(ctx, params.slug, value);
		if (!added.ok) return refusedForm(form, added);
		redirect(303, `/stores/parts/${added.value.slug}`);
	})
};
