import { redirect } from '@sveltejs/kit';
import { blankLabLimit, labLimitInput } from '$lib/schemas/lab-limit';
import { guarded } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createLabLimit } from '$lib/server/services/bench-plan/create-limit';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async (_event: PageServerLoadEvent) => ({
	title: 'New limit',
	form: await blankForm(labLimitInput, blankLabLimit())
}));

export const actions = {
	default: guarded('bench.plan', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, labLimitInput, blankLabLimit());
		if (!value) return refuseForm(form);
		const created = await createLabLimit(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, '/bench/limits');
	})
};
