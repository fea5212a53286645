import { fail, redirect } from '@sveltejs/kit';
import { blankTerm, termEdit, termRetire } from '$lib/schemas/glossary';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { showTerm } from '$lib/server/services/articles/read-glossary';
import { editTerm, retireTerm } from '$lib/server/services/articles/write-term';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('glossary.edit', async ({ params }: PageServerLoadEvent, ctx) => {
	const { term, explanation, aliases, version, retiredAt } = valueOrError(await showTerm(ctx, params.term));
	const typed = { term, explanation, aliases: aliases.join(', '), version };
	return {
		title: term,
		retired: retiredAt !== null,
		version,
		form: await blankForm(termEdit, typed, 'edit')
	};
});

export const actions = {
	edit: guarded('glossary.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { slug: _, ...blank } = blankTerm();
		const { form, value } = await readForm(request, termEdit, { ...blank, version: 0 }, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editTerm(ctx, params.term, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, '/desk/glossary');
	}),
	retire: guarded('glossary.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, termRetire);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const retired = await retireTerm(ctx, params.term, value);
		if (!retired.ok) return fail(statusOf(retired.reason), { refused: retired.message });
		redirect(303, '/desk/glossary');
	})
};
