import { fail, redirect } from '@sveltejs/kit';
import { blankMeaning, meaningEdit, meaningRemove } from '$lib/schemas/firmware-meaning';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { editMeaning } from '$lib/server/services/bench-plan/edit-meaning';
import { offerFamilies } from '$lib/server/services/bench-plan/offer-families';
import { removeMeaning } from '$lib/server/services/bench-plan/remove-meaning';
import { showMeaning } from '$lib/server/services/bench-plan/show-meaning';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const meaning = valueOrError(await showMeaning(ctx, Number(params.meaning)));
	const { family, setting, quantity, coreGroup, version } = meaning;
	const typed = { family, setting, quantity, coreGroup: String(coreGroup), version };
	return {
		title: 'Change a meaning',
		version,
		families: valueOrError(await offerFamilies(ctx)),
		form: await blankForm(meaningEdit, typed, 'edit')
	};
});

export const actions = {
	edit: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, meaningEdit, { ...blankMeaning(), version: 0 }, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editMeaning(ctx, Number(params.meaning), value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, '/bench/meanings');
	}),
	remove: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, meaningRemove);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const removed = await removeMeaning(ctx, Number(params.meaning), value);
		if (!removed.ok) return fail(statusOf(removed.reason), { refused: removed.message });
		redirect(303, '/bench/meanings');
	})
};
