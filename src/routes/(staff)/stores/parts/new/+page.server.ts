import { redirect } from '@sveltejs/kit';
import { blankPart, partInput } from '$lib/schemas/part';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createPart } from '$lib/server/services/stores/create-part';
import { offerPrice } from '$lib/server/services/stores/offer-price';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('stores.edit', async (_event: PageServerLoadEvent, ctx) => {
	const { today, currency } = valueOrError(await offerPrice(ctx));
	return { title: 'New part', form: await blankForm(partInput, blankPart(today, currency)) };
});

export const actions = {
	default: guarded('stores.edit', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, partInput, {
			...blankPart('', ''),
			specification: [],
			prices: []
		});
		if (!value) return refuseForm(form);
		const created = await createPart(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/stores/parts/${created.value.slug}`);
	})
};
