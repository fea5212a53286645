import { redirect } from '@sveltejs/kit';
import { asTyped, blankWorkload, workloadEdit } from '$lib/schemas/workload';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editWorkload } from '$lib/server/services/bench-plan/edit-workload';
import { showWorkload } from '$lib/server/services/bench-plan/show-workload';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const { workload, measured } = valueOrError(await showWorkload(ctx, params.workload));
	return {
		title: `Change ${workload.name}`,
		workload: { slug: workload.slug, name: workload.name },
		measured,
		form: await blankForm(workloadEdit, { ...asTyped(workload), version: workload.version })
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { slug: _, ...blank } = blankWorkload();
		const { form, value } = await readForm(request, workloadEdit, { ...blank, version: 0 });
		if (!value) return refuseForm(form);
		const edited = await editWorkload(ctx, params.workload, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/bench/workloads/${edited.value.slug}`);
	})
};
