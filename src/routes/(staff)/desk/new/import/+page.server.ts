import { articleImport } from '$lib/schemas/import-article';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { bytesOf, readFileForm } from '$lib/server/http/read-file-form';
import { importArticle } from '$lib/server/services/articles/import-article';
import { readStart } from '$lib/server/services/articles/read-start';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('article.create', async (_: PageServerLoadEvent, ctx) => {
	const { campaigns } = valueOrError(await readStart(ctx));
	return { title: 'Import an article', campaigns };
});

export const actions = {
	default: guarded('article.create', async ({ request }: RequestEvent, ctx) => {
		const form = await readFileForm(request, articleImport);
		if (!form.value) return form.refused;
		const { file, ...rest } = form.value;
		const made = await importArticle(ctx, { ...rest, ...(await bytesOf(file)) });
		return made.ok ? { done: made.value } : form.refuse(made);
	})
};
