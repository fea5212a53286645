import { redirect } from '@sveltejs/kit';
import { blankSpecificationLine, partEdit, type PartEditTyped } from '$lib/schemas/part';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editPart } from '$lib/server/services/stores/edit-part';
import { showPart } from '$lib/server/services/stores/show-part';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blank = (): PartEditTyped => ({ version: 0, kind: 'other', maker: '', model: '', specification: [] });

export const load = guarded('stores.edit', async ({ params }: PageServerLoadEvent, ctx) => {
	const { part } = valueOrError(await showPart(ctx, params.slug));
	const { version, kind, maker, model, slug } = part;
	const lines = part.specification.map((line) => ({ ...blankSpecificationLine(), ...line }));
	const specification = [...lines, blankSpecificationLine(), blankSpecificationLine()];
	return {
		title: `Change ${maker} ${model}`,
		slug,
		name: `${maker} ${model}`,
		form: await blankForm(partEdit, { version, kind, maker, model, specification })
	};
});

export const actions = {
	default: guarded('stores.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, partEdit, blank());
		if (!value) return refuseForm(form);
		const edited = await editPart(ctx, params.slug, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/stores/parts/${edited.value.slug}`);
	})
};
