import { redirect } from '@sveltejs/kit';
import { blankTemplate, templateInput } from '$lib/schemas/template';
import { guarded } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createTemplate } from '$lib/server/services/articles/write-template';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('template.edit', async (_event: PageServerLoadEvent) => ({
	title: 'New template',
	form: await blankForm(templateInput, blankTemplate())
}));

export const actions = {
	default: guarded('template.edit', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, templateInput, blankTemplate());
		if (!value) return refuseForm(form);
		const created = await createTemplate(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/desk/templates/${created.value.kind}`);
	})
};
