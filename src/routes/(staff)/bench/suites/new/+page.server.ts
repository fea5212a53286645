import { redirect } from '@sveltejs/kit';
import { suiteInput, typedSuite } from '$lib/schemas/suite';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createSuite } from '$lib/server/services/bench-plan/create-suite';
import { offerSuite } from '$lib/server/services/bench-plan/offer-suite';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ url }: PageServerLoadEvent, ctx) => {
	const { workloads, from } = valueOrError(await offerSuite(ctx, url.searchParams.get('from') ?? ''));
	return {
		title: from ? `A suite from ${from.name}` : 'New suite',
		workloads,
		from: from && { slug: from.slug, name: from.name },
		form: await blankForm(suiteInput, { ...typedSuite(workloads, from), slug: '' })
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, suiteInput, { ...typedSuite([]), slug: '' });
		if (!value) return refuseForm(form);
		const created = await createSuite(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/bench/suites/${created.value.slug}`);
	})
};
