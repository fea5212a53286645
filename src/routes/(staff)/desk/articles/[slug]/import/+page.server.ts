import { revisionImport } from '$lib/schemas/import-article';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { bytesOf, readFileForm } from '$lib/server/http/read-file-form';
import { importRevision } from '$lib/server/services/articles/import-article';
import { readForImport } from '$lib/server/services/articles/read-for-import';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('article.edit', async ({ params }: PageServerLoadEvent, ctx) => {
	const article = valueOrError(await readForImport(ctx, params.slug));
	return { title: `Import into ${article.title}`, article };
});

export const actions = {
	default: guarded('article.edit', async ({ params, request }: RequestEvent, ctx) => {
		const form = await readFileForm(request, revisionImport);
		if (!form.value) return form.refused;
		const { file, ...rest } = form.value;
		const saved = await importRevision(ctx, params.slug, { ...rest, ...(await bytesOf(file)) });
		return saved.ok ? { done: saved.value } : form.refuse(saved);
	})
};
