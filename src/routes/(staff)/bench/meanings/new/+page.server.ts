import { redirect } from '@sveltejs/kit';
import { blankMeaning, meaningInput } from '$lib/schemas/firmware-meaning';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createMeaning } from '$lib/server/services/bench-plan/create-meaning';
import { offerFamilies } from '$lib/server/services/bench-plan/offer-families';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ url }: PageServerLoadEvent, ctx) => ({
	title: 'New meaning',
	families: valueOrError(await offerFamilies(ctx)),
	form: await blankForm(meaningInput, blankMeaning(url.searchParams))
}));

export const actions = {
	default: guarded('bench.plan', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, meaningInput, blankMeaning());
		if (!value) return refuseForm(form);
		const created = await createMeaning(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, '/bench/meanings');
	})
};
