import { redirect } from '@sveltejs/kit';
import { asTypedSettings, profileInput, type ProfileTyped } from '$lib/schemas/profile';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { createProfile } from '$lib/server/services/bench-plan/create-profile';
import { offerProfile, type ProfileOffer } from '$lib/server/services/bench-plan/offer-profile';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blank = (rig: string): ProfileTyped => ({
	rig,
	name: '',
	slug: '',
	parent: 'stock',
	notes: '',
	settings: []
});

/** A form over the parent that was asked for, or with the settings of the profile that is copied. */
function start({ rig, profiles }: ProfileOffer, asked: URLSearchParams): ProfileTyped {
	const from = profiles.find((one) => one.slug === asked.get('from'));
	const above = profiles.find((one) => one.id === from?.parentId);
	const parent = above ?? from ?? profiles.find((one) => one.slug === asked.get('parent'));
	return {
		...blank(rig.slug),
		parent: parent?.slug ?? 'stock',
		name: from ? `${from.name}, changed` : '',
		notes: from?.notes ?? '',
		// A copy of stock stands over stock, so it starts with nothing of its own.
		settings: asTypedSettings(above ? (from?.settings ?? []) : [])
	};
}

export const load = guarded('bench.plan', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const offer = valueOrError(await offerProfile(ctx, params.rig));
	return {
		title: 'New profile',
		...offer,
		form: await blankForm(profileInput, start(offer, url.searchParams))
	};
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, profileInput, blank(params.rig));
		if (!value) return refuseForm(form);
		const created = await createProfile(ctx, { ...value, rig: params.rig });
		if (!created.ok) return refusedForm(form, created);
		redirect(303, `/bench/rigs/${created.value.rig}/profiles/${created.value.slug}`);
	})
};
