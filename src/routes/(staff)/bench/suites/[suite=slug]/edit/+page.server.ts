import { redirect } from '@sveltejs/kit';
import { firstOf } from '$lib/domain/shared/first-of';
import { suiteEdit, typedSuite } from '$lib/schemas/suite';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editSuite } from '$lib/server/services/bench-plan/edit-suite';
import { offerSuite } from '$lib/server/services/bench-plan/offer-suite';
import { showSuite } from '$lib/server/services/bench-plan/show-suite';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const [shown, offered] = await Promise.all([showSuite(ctx, params.suite), offerSuite(ctx, '')]);
	const { suite, workloads } = valueOrError(shown);
	const slugs = workloads.map((row) => row.slug);
	const choices = firstOf(valueOrError(offered).workloads, slugs);
	const typed = typedSuite(choices, { ...suite, workloads });
	return {
		title: `Change ${suite.name}`,
		suite: { slug: suite.slug, name: suite.name },
		workloads: choices,
		form: await blankForm(suiteEdit, { ...typed, version: suite.version })
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, suiteEdit, { ...typedSuite([]), version: 0 });
		if (!value) return refuseForm(form);
		const edited = await editSuite(ctx, params.suite, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/bench/suites/${edited.value.slug}`);
	})
};
