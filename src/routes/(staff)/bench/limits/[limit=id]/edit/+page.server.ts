import { fail, redirect } from '@sveltejs/kit';
import { blankLabLimit, labLimitEdit, labLimitRemove } from '$lib/schemas/lab-limit';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { editLabLimit } from '$lib/server/services/bench-plan/edit-limit';
import { removeLabLimit } from '$lib/server/services/bench-plan/remove-limit';
import { showLimit } from '$lib/server/services/bench-plan/show-limit';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const limit = valueOrError(await showLimit(ctx, Number(params.limit)));
	const { quantity, partKind, unit, source, version } = limit;
	const typed = { quantity, partKind, limit: String(limit.limit), unit, source, version };
	return {
		title: 'Change a limit',
		version,
		form: await blankForm(labLimitEdit, typed, 'edit')
	};
});

export const actions = {
	edit: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, labLimitEdit, { ...blankLabLimit(), version: 0 }, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editLabLimit(ctx, Number(params.limit), value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, '/bench/limits');
	}),
	remove: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, labLimitRemove);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const removed = await removeLabLimit(ctx, Number(params.limit), value);
		if (!removed.ok) return fail(statusOf(removed.reason), { refused: removed.message });
		redirect(303, '/bench/limits');
	})
};
