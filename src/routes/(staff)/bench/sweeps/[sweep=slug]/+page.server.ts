import { fail, redirect } from '@sveltejs/kit';
import { may } from '$lib/domain/people/policy';
import { archiveInput } from '$lib/schemas/ladder';
import { blankPass, passForm, passVoid } from '$lib/schemas/sweep';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { drawPlate } from '$lib/server/rendering/draw-plate';
import { archiveSweep } from '$lib/server/services/stability/edit-sweep';
import { readSweep } from '$lib/server/services/stability/read-sweep';
import { recordPass } from '$lib/server/services/stability/record-passes';
import { voidPass } from '$lib/server/services/stability/void-pass';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await readSweep(ctx, params.sweep));
	return {
		title: page.sweep.name,
		...page,
		drawing: page.plate && drawPlate(page.plate),
		pass: await blankForm(passForm, blankPass(crypto.randomUUID()), 'pass'),
		stored: Number(url.searchParams.get('stored') ?? 0),
		records: may(ctx.actor, 'run.record'),
		plans: may(ctx.actor, 'bench.plan')
	};
});

export const actions = {
	record: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, passForm, blankPass(''), 'pass');
		if (!value) return refuseForm(form);
		const recorded = await recordPass(ctx, params.sweep, value);
		if (!recorded.ok) return refusedForm(form, recorded);
		redirect(303, `/bench/sweeps/${recorded.value.sweep}?stored=${recorded.value.passes[0]?.number}`);
	}),
	void: guarded('run.void', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, passVoid);
		if (!value) return refused;
		const voided = await voidPass(ctx, params.sweep, value);
		if (voided.ok) redirect(303, `/bench/sweeps/${params.sweep}`);
		const { reason, message, fields = {} } = voided;
		return fail(statusOf(reason), { refused: { typed, message, fields } });
	}),
	archive: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, archiveInput);
		if (!value) return refused;
		const archived = await archiveSweep(ctx, params.sweep, value);
		if (archived.ok) redirect(303, `/bench/sweeps/${archived.value.slug}`);
		return fail(statusOf(archived.reason), { refused: { typed, message: archived.message, fields: {} } });
	})
};
