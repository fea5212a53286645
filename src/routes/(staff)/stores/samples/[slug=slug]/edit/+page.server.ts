import { redirect } from '@sveltejs/kit';
import { sampleEdit } from '$lib/schemas/sample';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editSample } from '$lib/server/services/stores/edit-sample';
import { showSample } from '$lib/server/services/stores/show-sample';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('stores.edit', async ({ params }: PageServerLoadEvent, ctx) => {
	const { sample } = valueOrError(await showSample(ctx, params.slug));
	const { version, serial, provenance, condition, place } = sample;
	return {
		title: `Change ${sample.slug}`,
		sample,
		form: await blankForm(sampleEdit, { version, serial, provenance, condition, place })
	};
});

export const actions = {
	default: guarded('stores.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, sampleEdit, { version: 0, provenance: 'bought' });
		if (!value) return refuseForm(form);
		const edited = await editSample(ctx, params.slug, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/stores/samples/${edited.value.slug}`);
	})
};
