import { redirect } from '@sveltejs/kit';
import { rigCorrect } from '$lib/schemas/rig';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { chooseSamples } from '$lib/server/services/bench-plan/choose-samples';
import { offerFamilies } from '$lib/server/services/bench-plan/offer-families';
import { correctRig } from '$lib/server/services/bench-plan/correct-rig';
import { showRig } from '$lib/server/services/bench-plan/show-rig';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const [shown, offered, families] = await Promise.all([
		showRig(ctx, params.rig),
		chooseSamples(ctx),
		offerFamilies(ctx)
	]);
	const { rig, revisions } = valueOrError(shown);
	const { version, name, firmwareFamily, firmware, driver, os } = rig;
	const samples = (revisions[0]?.samples ?? []).map((sample) => sample.slug);
	return {
		title: `Change ${name}`,
		rig: { slug: rig.slug, name, revision: rig.revision },
		measured: revisions[0]?.measured ?? false,
		samples: valueOrError(offered),
		families: valueOrError(families),
		form: await blankForm(rigCorrect, { version, name, firmwareFamily, samples, firmware, driver, os })
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rigCorrect, { version: 0, name: '', samples: [] });
		if (!value) return refuseForm(form);
		const corrected = await correctRig(ctx, params.rig, value);
		if (!corrected.ok) return refusedForm(form, corrected);
		redirect(303, `/bench/rigs/${corrected.value.slug}`);
	})
};
