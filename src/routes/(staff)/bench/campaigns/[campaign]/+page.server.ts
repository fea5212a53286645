import { fail } from '@sveltejs/kit';
import type { Outcome } from '$lib/domain/shared/outcome';
import { boardQuery } from '$lib/schemas/campaign';
import {
	cellSign,
	cellUnsign,
	chosenSign,
	chosenUnsign,
	plainRun,
	readingCount,
	runEdit,
	runVoid
} from '$lib/schemas/run';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { excludeReading, includeReading } from '$lib/server/services/bench/count-reading';
import { editRun } from '$lib/server/services/bench/edit-run';
import { readBoard } from '$lib/server/services/bench/read-board';
import { recordPlainRun } from '$lib/server/services/bench/record-plain-run';
import { signCells, signChosenCells, type Signed } from '$lib/server/services/bench/sign-cells';
import { unsignCell } from '$lib/server/services/bench/unsign-cell';
import { unsignChosenCells } from '$lib/server/services/bench/unsign-chosen-cells';
import { voidRun } from '$lib/server/services/bench/void-run';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('bench.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const query = boardQuery.parse(Object.fromEntries(url.searchParams));
	const board = valueOrError(await readBoard(ctx, params.campaign, query));
	return { title: board.head.name, board, query, freshKey: crypto.randomUUID(), me: ctx.actor.id };
});

/** What the page says when an act is done, or the refusal with what was typed. */
const say = <T>(outcome: Outcome<T>, typed: Record<string, string>, words: (value: T) => string) =>
	outcome.ok
		? { said: words(outcome.value) }
		: fail(statusOf(outcome.reason), {
				refused: { typed, message: outcome.message, fields: outcome.fields ?? {} }
			});

const andSignature = (words: string) => (done: { signatureRemoved: boolean }) =>
	done.signatureRemoved ? `${words} The signature was taken off this cell.` : words;

function signedWords({ signed, missing }: Signed): string {
	const done = signed.length === 1 ? 'One cell signed.' : `${signed.length} cells signed.`;
	if (missing.length === 0) return done;
	const first = missing
		.slice(0, 3)
		.map((cell) => `${cell.profile}, ${cell.workload} (${cell.taken} of ${cell.needed})`)
		.join('; ');
	const more = missing.length > 3 ? ` and ${missing.length - 3} more` : '';
	return `${done} Readings are still wanted in ${first}${more}.`;
}

const unsignedWords = ({ removed, chosen }: { removed: number; chosen: number }) =>
	`${removed === 1 ? 'One signature was' : `${removed} signatures were`} taken off${
		removed < chosen ? `; ${chosen - removed} of the chosen cells had none` : ''
	}.`;

export const actions = {
	record: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, plainRun);
		if (!value) return refused;
		const stored = await recordPlainRun(ctx, params.campaign, value);
		return say(stored, typed, (run) => `${run.stored.length} readings stored.`);
	}),
	exclude: guarded('reading.exclude', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, readingCount);
		if (!value) return refused;
		const changed = await excludeReading(ctx, params.campaign, value);
		return say(changed, typed, andSignature('The reading no longer counts.'));
	}),
	include: guarded('reading.exclude', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, readingCount);
		if (!value) return refused;
		const changed = await includeReading(ctx, params.campaign, value);
		return say(changed, typed, andSignature('The reading counts again.'));
	}),
	void: guarded('run.void', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, runVoid);
		if (!value) return refused;
		const voided = await voidRun(ctx, params.campaign, value);
		return say(voided, typed, andSignature('The run no longer counts.'));
	}),
	edit: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, runEdit);
		if (!value) return refused;
		return say(await editRun(ctx, params.campaign, value), typed, () => 'The run was corrected.');
	}),
	sign: guarded('cell.sign', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, cellSign);
		if (!value) return refused;
		return say(await signCells(ctx, params.campaign, value), typed, signedWords);
	}),
	unsign: guarded('cell.sign', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, cellUnsign);
		if (!value) return refused;
		return say(await unsignCell(ctx, params.campaign, value), typed, () => 'The signature was taken off.');
	}),
	'sign-chosen': guarded('cell.sign', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, chosenSign, ['cell']);
		if (!value) return refused;
		return say(await signChosenCells(ctx, params.campaign, value), typed, signedWords);
	}),
	'unsign-chosen': guarded('cell.sign', async ({ request, params }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, chosenUnsign, ['cell']);
		if (!value) return refused;
		return say(await unsignChosenCells(ctx, params.campaign, value), typed, unsignedWords);
	})
};
