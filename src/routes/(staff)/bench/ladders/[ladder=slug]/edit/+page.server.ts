import { redirect } from '@sveltejs/kit';
import { ladderEdit } from '$lib/schemas/ladder';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { editLadder } from '$lib/server/services/stability/edit-ladder';
import { readLadder } from '$lib/server/services/stability/read-ladder';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blank = {
	name: '',
	purpose: '',
	stepMhz: '',
	limitClockMhz: '',
	limitVolts: '',
	limitTempC: '',
	limitSource: '',
	version: 0
};

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const { ladder } = valueOrError(await readLadder(ctx, params.ladder, null));
	const { slug, name, purpose, limitSource, version } = ladder;
	const stored = {
		name,
		purpose,
		stepMhz: String(ladder.stepMhz),
		limitClockMhz: String(ladder.limitClockMhz),
		limitVolts: String(ladder.limitVolts),
		limitTempC: String(ladder.limitTempC),
		limitSource,
		version
	};
	return { title: `Change ${name}`, ladder: { slug, name }, form: await blankForm(ladderEdit, stored) };
});

export const actions = {
	default: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, ladderEdit, blank);
		if (!value) return refuseForm(form);
		const edited = await editLadder(ctx, params.ladder, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, `/bench/ladders/${edited.value.slug}`);
	})
};
