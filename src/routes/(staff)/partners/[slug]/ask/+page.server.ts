import { redirect } from '@sveltejs/kit';
import { blankLoan, loanInput } from '$lib/schemas/partner';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { lendableSamples } from '$lib/server/services/partners/lendable-samples';
import { askForLoan } from '$lib/server/services/partners/save-loan';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('loan.edit', async ({ params }: PageServerLoadEvent, ctx) => {
	const { partner, samples } = valueOrError(await lendableSamples(ctx, params.slug));
	return {
		title: `Ask ${partner.name} for a loan`,
		partner,
		samples,
		form: await blankForm(loanInput, blankLoan)
	};
});

export const actions = {
	default: guarded('loan.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, loanInput, blankLoan);
		if (!value) return refuseForm(form);
		const asked = await askForLoan(ctx, params.slug, value);
		if (!asked.ok) return refusedForm(form, asked);
		redirect(303, `/partners/loans/${asked.value.id}`);
	})
};
