import { redirect } from '@sveltejs/kit';
import { blankTerm, termInput } from '$lib/schemas/glossary';
import { guarded } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createTerm } from '$lib/server/services/articles/write-term';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('glossary.edit', async (_event: PageServerLoadEvent) => ({
	title: 'New term',
	form: await blankForm(termInput, blankTerm())
}));

export const actions = {
	default: guarded('glossary.edit', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, termInput, blankTerm());
		if (!value) return refuseForm(form);
		const created = await createTerm(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, '/desk/glossary');
	})
};
