import { fail, redirect } from '@sveltejs/kit';
import {
	asTypedInstrument,
	blankInstrument,
	instrumentEdit,
	instrumentRetire
} from '$lib/schemas/instrument';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { editInstrument, retireInstrument } from '$lib/server/services/bench-plan/edit-instrument';
import { showInstrument } from '$lib/server/services/bench-plan/show-instrument';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.plan', async ({ params }: PageServerLoadEvent, ctx) => {
	const { instrument, uses } = valueOrError(await showInstrument(ctx, params.instrument));
	const { name, version, retiredAt } = instrument;
	return {
		title: name,
		retired: retiredAt !== null,
		version,
		uses,
		form: await blankForm(instrumentEdit, { ...asTypedInstrument(instrument), version }, 'edit')
	};
});

export const actions = {
	edit: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { slug: _, ...blank } = blankInstrument();
		const { form, value } = await readForm(request, instrumentEdit, { ...blank, version: 0 }, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editInstrument(ctx, params.instrument, value);
		if (!edited.ok) return refusedForm(form, edited);
		redirect(303, '/bench/instruments');
	}),
	retire: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { value, refused } = await readPlainForm(request, instrumentRetire);
		if (!value) return fail(422, { refused: refused?.data.refused.message ?? '' });
		const retired = await retireInstrument(ctx, params.instrument, value);
		if (!retired.ok) return fail(statusOf(retired.reason), { refused: retired.message });
		redirect(303, '/bench/instruments');
	})
};
