import { redirect } from '@sveltejs/kit';
import { rigRevise } from '$lib/schemas/rig';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { chooseSamples } from '$lib/server/services/bench-plan/choose-samples';
import { reviseRig } from '$lib/server/services/bench-plan/revise-rig';
import { showRig } from '$lib/server/services/bench-plan/show-rig';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const [shown, offered] = await Promise.all([showRig(ctx, params.rig), chooseSamples(ctx)]);
	const { rig, revisions } = valueOrError(shown);
	const { version, firmware, driver, os } = rig;
	const samples = (revisions[0]?.samples ?? []).map((sample) => sample.slug);
	return {
		title: `Revise ${rig.name}`,
		rig: { slug: rig.slug, name: rig.name, revision: rig.revision },
		samples: valueOrError(offered),
		form: await blankForm(rigRevise, { version, samples, firmware, driver, os, change: '' })
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, rigRevise, { version: 0, samples: [], change: '' });
		if (!value) return refuseForm(form);
		const revised = await reviseRig(ctx, params.rig, value);
		if (!revised.ok) return refusedForm(form, revised);
		redirect(303, `/bench/rigs/${revised.value.slug}`);
	})
};
