import { partnerEdit, blankPartner } from '$lib/schemas/partner';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPartner } from '$lib/server/services/partners/list-partners';
import { editPartner } from '$lib/server/services/partners/save-partner';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('partner.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const { partner, loans, today } = valueOrError(await readPartner(ctx, params.slug));
	const { name, contactName, contactEmail, notes, version } = partner;
	return {
		title: name,
		partner,
		loans,
		today,
		form: await blankForm(partnerEdit, { name, contactName, contactEmail, notes, version })
	};
});

export const actions = {
	edit: guarded('partner.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, partnerEdit, { ...blankPartner, version: 1 });
		if (!value) return refuseForm(form);
		const { version, ...input } = value;
		const edited = await editPartner(ctx, params.slug, version, input);
		return edited.ok ? { form } : refusedForm(form, edited);
	})
};
