import { redirect } from '@sveltejs/kit';
import { articleStart } from '$lib/schemas/article';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { readStart } from '$lib/server/services/articles/read-start';
import { startArticle } from '$lib/server/services/articles/start-article';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const blank = { title: '', template: '', campaigns: [] as string[] };

export const load = guarded('article.create', async ({ url }: PageServerLoadEvent, ctx) => {
	const { templates, campaigns } = valueOrError(await readStart(ctx));
	// A link from a campaign's page brings its campaign along.
	const form = await blankForm(articleStart, { ...blank, campaigns: url.searchParams.getAll('campaign') });
	return { title: 'New article', form, templates, campaigns };
});

export const actions = {
	default: guarded('article.create', async ({ request }: RequestEvent, ctx) => {
		const { form, value } = await readForm(request, articleStart, blank);
		if (!value) return refuseForm(form);
		const started = await startArticle(ctx, value);
		if (!started.ok) return refusedForm(form, started);
		redirect(303, `/desk/articles/${started.value.slug}`);
	})
};
