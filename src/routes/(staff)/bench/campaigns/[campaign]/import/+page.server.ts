import { fail, redirect } from '@sveltejs/kit';
import type { Refusal } from '$lib/domain/shared/outcome';
import { importInput, readImportForm } from '$lib/schemas/import';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { importReadings, type Imported } from '$lib/server/services/bench/import-readings';
import { offerImport, previewFile } from '$lib/server/services/bench/offer-import';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('run.record', async ({ params }: PageServerLoadEvent, ctx) => {
	const offer = valueOrError(await offerImport(ctx, params.campaign));
	return { title: `Import into ${offer.name}`, offer };
});

const refused = (outcome: Refusal, text: string) =>
	fail(statusOf(outcome.reason), { refused: outcome.message, text });

const words = ({ readings, runs, left, signaturesRemoved }: Imported) =>
	new URLSearchParams({
		imported: String(readings),
		runs: String(runs),
		left: String(left),
		unsigned: String(signaturesRemoved)
	});

export const actions = {
	preview: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const sent = await readImportForm(await request.formData());
		const input = importInput.safeParse(sent);
		if (!input.success) return fail(422, { refused: input.error.issues[0]?.message ?? '', text: sent.text });
		const preview = await previewFile(ctx, params.campaign, input.data.text);
		return preview.ok ? { preview: preview.value, text: sent.text } : refused(preview, sent.text);
	}),
	confirm: guarded('run.record', async ({ request, params }: RequestEvent, ctx) => {
		const sent = await readImportForm(await request.formData());
		const input = importInput.safeParse(sent);
		if (!input.success) return fail(422, { refused: input.error.issues[0]?.message ?? '', text: sent.text });
		const imported = await importReadings(ctx, params.campaign, input.data);
		if (!imported.ok) return refused(imported, sent.text);
		redirect(303, `/bench/campaigns/${params.campaign}?${words(imported.value)}`);
	})
};
