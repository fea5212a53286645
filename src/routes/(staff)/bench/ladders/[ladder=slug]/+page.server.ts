import { fail, redirect } from '@sveltejs/kit';
import { may } from '$lib/domain/people/policy';
import { attemptGrid, blankGrid } from '$lib/schemas/attempt-grid';
import { archiveInput, attemptForm, attemptVoid } from '$lib/schemas/ladder';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { drawPlate } from '$lib/server/rendering/draw-plate';
import { archiveLadder } from '$lib/server/services/stability/edit-ladder';
import { readLadder } from '$lib/server/services/stability/read-ladder';
import { recordAttempt, recordAttempts } from '$lib/server/services/stability/record-attempts';
import { voidAttempt } from '$lib/server/services/stability/void-attempt';
import { blankAttempt } from './blank-attempt';
import type { PageServerLoadEvent, RequestEvent } from './$types';

/** The voltage to propose at, out of the address; null where it names none. */
function voltsOf(params: URLSearchParams): number | null {
	const volts = Number((params.get('volts') ?? '').replace(',', '.'));
	return volts >= 0.3 && volts <= 2.5 ? volts : null;
}

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const page = valueOrError(await readLadder(ctx, params.ladder, voltsOf(url.searchParams)));
	const last = page.attempts.find((one) => one.voidedAt === null);
	const blank = blankAttempt(page.report, last, crypto.randomUUID());
	return {
		title: page.ladder.name,
		...page,
		drawing: page.plate && drawPlate(page.plate),
		attempt: await blankForm(attemptForm, blank, 'attempt'),
		grid: await blankForm(attemptGrid, blankGrid(crypto.randomUUID(), String(blank.stress)), 'grid'),
		stored: Number(url.searchParams.get('stored') ?? 0),
		records: may(ctx.actor, 'run.record'),
		plans: may(ctx.actor, 'bench.plan')
	};
});

const blank = blankAttempt({ stresses: [] }, undefined, '');

export const actions = {
	record: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, attemptForm, blank, 'attempt');
		if (!value) return refuseForm(form);
		const recorded = await recordAttempt(ctx, params.ladder, value);
		if (!recorded.ok) return refusedForm(form, recorded);
		redirect(303, `/bench/ladders/${recorded.value.ladder}?stored=1`);
	}),
	grid: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, attemptGrid, blankGrid('', ''), 'grid');
		if (!value) return refuseForm(form);
		const recorded = await recordAttempts(ctx, params.ladder, value.attempts);
		if (!recorded.ok) return refusedForm(form, recorded);
		redirect(303, `/bench/ladders/${recorded.value.ladder}?stored=${recorded.value.attempts.length}`);
	}),
	void: guarded('run.void', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, attemptVoid);
		if (!value) return refused;
		const voided = await voidAttempt(ctx, params.ladder, value);
		if (voided.ok) redirect(303, `/bench/ladders/${params.ladder}`);
		const { reason, message, fields = {} } = voided;
		return fail(statusOf(reason), { refused: { typed, message, fields } });
	}),
	archive: guarded('bench.plan', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, archiveInput);
		if (!value) return refused;
		const archived = await archiveLadder(ctx, params.ladder, value);
		if (archived.ok) redirect(303, `/bench/ladders/${archived.value.slug}`);
		return fail(statusOf(archived.reason), { refused: { typed, message: archived.message, fields: {} } });
	})
};
