import { fail, redirect } from '@sveltejs/kit';
import { linesOfChecklist } from '$lib/domain/articles/template';
import { blankTemplate, templateEdit, templateRetire, templateVersion } from '$lib/schemas/template';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { showTemplate } from '$lib/server/services/articles/read-templates';
import { editTemplate, restoreTemplate, retireTemplate } from '$lib/server/services/articles/write-template';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('template.edit', async ({ params }: PageServerLoadEvent, ctx) => {
	const { template, saves, ships } = valueOrError(await showTemplate(ctx, params.template));
	const { name, title, standfirst, for: purpose, body, checklist, own, retired } = template;
	const version = own?.version ?? 0;
	const typed = {
		name,
		title,
		standfirst,
		for: purpose,
		body,
		checklist: linesOfChecklist(checklist),
		version
	};
	const form = await blankForm(templateEdit, typed, 'edit');
	return { title: name, kind: params.template, form, version, retired, saves, ships };
});

export const actions = {
	edit: guarded('template.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { kind: _, ...blank } = blankTemplate();
		const { form, value } = await readForm(request, templateEdit, { ...blank, version: 0 }, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editTemplate(ctx, params.template, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/desk/templates/${params.template}`);
	}),
	restore: guarded('template.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, templateVersion);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const restored = await restoreTemplate(ctx, params.template, value);
		if (!restored.ok) return fail(statusOf(restored.reason), { refused: restored.message });
		redirect(303, `/desk/templates/${params.template}`);
	}),
	retire: guarded('template.edit', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, templateRetire);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const retired = await retireTemplate(ctx, params.template, value);
		if (!retired.ok) return fail(statusOf(retired.reason), { refused: retired.message });
		redirect(303, '/desk/templates');
	})
};
