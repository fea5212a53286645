import { redirect } from '@sveltejs/kit';
import { blankInstrument, instrumentInput } from '$lib/schemas/instrument';
import { guarded } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createInstrument } from '$lib/server/services/bench-plan/create-instrument';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async (_event: PageServerLoadEvent) => ({
	title: 'New instrument',
	form: await blankForm(instrumentInput, blankInstrument())
}));

export const actions = {
	default: guarded('bench.plan', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, instrumentInput, blankInstrument());
		if (!value) return refuseForm(form);
		const created = await createInstrument(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, '/bench/instruments');
	})
};
