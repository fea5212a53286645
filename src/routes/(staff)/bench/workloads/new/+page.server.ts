import { redirect } from '@sveltejs/kit';
import { isSlug } from '$lib/domain/shared/slug';
import { blankWorkload, nextVersion, workloadInput } from '$lib/schemas/workload';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createWorkload } from '$lib/server/services/bench-plan/create-workload';
import { showWorkload } from '$lib/server/services/bench-plan/show-workload';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ url }: PageServerLoadEvent, ctx) => {
	const from = url.searchParams.get('from');
	const before = from && isSlug(from) ? valueOrError(await showWorkload(ctx, from)).workload : null;
	return {
		title: before ? `New version of ${before.name}` : 'New workload',
		from: before && { slug: before.slug, name: before.name },
		form: await blankForm(workloadInput, before ? nextVersion(before) : blankWorkload())
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, workloadInput, blankWorkload());
		if (!value) return refuseForm(form);
		const created = await createWorkload(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/bench/workloads/${created.value.slug}`);
	})
};
