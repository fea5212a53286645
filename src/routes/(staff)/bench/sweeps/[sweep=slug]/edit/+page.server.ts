import { redirect } from '@sveltejs/kit';
import { sweepEdit } from '$lib/schemas/sweep';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editSweep } from '$lib/server/services/stability/edit-sweep';
import { readSweep } from '$lib/server/services/stability/read-sweep';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blank = { name: '', purpose: '', wantedClockMhz: '', currentStepA: '', version: 0 };

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const { sweep } = valueOrError(await readSweep(ctx, params.sweep));
	const { slug, name, purpose, version } = sweep;
	const stored = {
		name,
		purpose,
		wantedClockMhz: String(sweep.wantedClockMhz),
		currentStepA: String(sweep.currentStepA),
		version
	};
	return { title: `Change ${name}`, sweep: { slug, name }, form: await blankForm(sweepEdit, stored) };
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, sweepEdit, blank);
		if (!value) return refuseForm(form);
		const edited = await editSweep(ctx, params.sweep, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/bench/sweeps/${edited.value.slug}`);
	})
};
