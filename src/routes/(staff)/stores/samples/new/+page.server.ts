import { redirect } from '@sveltejs/kit';
import { blankSample, sampleInput } from '$lib/schemas/sample';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { choosePart } from '$lib/server/services/stores/choose-part';
import { createSample } from '$lib/server/services/stores/create-sample';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('stores.edit', async ({ url }: PageServerLoadEvent, ctx) => {
	const parts = valueOrError(await choosePart(ctx));
	const wanted = parts.find((part) => part.slug === url.searchParams.get('part'));
	return { title: 'New sample', parts, form: await blankForm(sampleInput, blankSample(wanted?.slug ?? '')) };
});

export const actions = {
	default: guarded('stores.edit', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, sampleInput, blankSample(''));
		if (!value) return refuseForm(form);
		const created = await createSample(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/stores/samples/${created.value.slug}`);
	})
};
