import { redirect } from '@sveltejs/kit';
import { blankPartner, partnerInput } from '$lib/schemas/partner';
import { guarded } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { addPartner } from '$lib/server/services/partners/save-partner';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('partner.edit', async (_event: PageServerLoadEvent) => ({
	title: 'New partner',
	form: await blankForm(partnerInput, blankPartner)
}));

export const actions = {
	default: guarded('partner.edit', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, partnerInput, blankPartner);
		if (!value) return refuseForm(form);
		const added = await addPartner(ctx, value);
		if (!added.ok) return refusedForm(form, added);
		redirect(303, `/partners/${added.value.slug}`);
	})
};
