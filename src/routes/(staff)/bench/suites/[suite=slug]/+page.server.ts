import { fail, redirect } from '@sveltejs/kit';
import { may } from '$lib/domain/people/policy';
import { suiteArchive } from '$lib/schemas/suite';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { archiveSuite } from '$lib/server/services/bench-plan/archive-suite';
import { showSuite } from '$lib/server/services/bench-plan/show-suite';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await showSuite(ctx, params.suite));
	return { title: page.suite.name, ...page, plans: may(ctx.actor, 'bench.plan') };
});

export const actions = {
	archive: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, suiteArchive);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const archived = await archiveSuite(ctx, params.suite, value);
		if (!archived.ok) return fail(statusOf(archived.reason), { refused: archived.message });
		redirect(303, `/bench/suites/${archived.value.slug}`);
	})
};
