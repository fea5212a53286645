import { redirect } from '@sveltejs/kit';
import { asTypedSettings, profileEdit } from '$lib/schemas/profile';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editProfile } from '$lib/server/services/bench-plan/edit-profile';
import { showProfile } from '$lib/server/services/bench-plan/show-profile';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await showProfile(ctx, params.rig, params.profile));
	const { profile, lineage, lab, measured } = page;
	const { version, name, notes } = profile;
	const settings = asTypedSettings(lineage.at(-1)?.settings ?? [], measured.length > 0 ? 0 : 3);
	return {
		title: `Change ${name}`,
		profile,
		lab,
		above: lineage.slice(0, -1),
		measured,
		form: await blankForm(profileEdit, { version, name, notes, settings })
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, profileEdit, { version: 0, name: '', settings: [] });
		if (!value) return refuseForm(form);
		const edited = await editProfile(ctx, params.rig, params.profile, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/bench/rigs/${params.rig}/profiles/${edited.value.slug}`);
	})
};
