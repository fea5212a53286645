import { redirect } from '@sveltejs/kit';
import { blankRig, rigInput } from '$lib/schemas/rig';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { chooseSamples } from '$lib/server/services/bench-plan/choose-samples';
import { offerFamilies } from '$lib/server/services/bench-plan/offer-families';
import { createRig } from '$lib/server/services/bench-plan/create-rig';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async (_event: PageServerLoadEvent, ctx) => ({
	title: 'New rig',
	samples: valueOrError(await chooseSamples(ctx)),
	families: valueOrError(await offerFamilies(ctx)),
	form: await blankForm(rigInput, blankRig())
}));

export const actions = {
	default: guarded('bench.plan', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rigInput, blankRig());
		if (!value) return refuseForm(form);
		const created = await createRig(ctx, value);
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/bench/rigs/${created.value.slug}`);
	})
};
