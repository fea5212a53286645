import { fail, redirect } from '@sveltejs/kit';
import { may } from '$lib/domain/people/policy';
import { articlesBulk, articlesQuery, viewForget, viewSave } from '$lib/schemas/article-list';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { bulkArticles } from '$lib/server/services/articles/bulk-articles';
import { forgetView, keepView } from '$lib/server/services/articles/keep-view';
import { listArticles } from '$lib/server/services/articles/list-articles';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('article.read', async ({ url }: PageServerLoadEvent, ctx) => {
	const query = readListing(articlesQuery, url.searchParams);
	const list = valueOrError(await listArticles(ctx, query));
	return {
		title: 'Articles',
		query,
		list,
		search: url.search.slice(1),
		mine: ctx.actor.id,
		mayStart: may(ctx.actor, 'article.create'),
		mayHandOver: may(ctx.actor, 'article.publish')
	};
});

export const actions = {
	bulk: guarded('article.edit', async ({ request }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, articlesBulk, ['slugs']);
		if (value === undefined) return fail(422, { ...refused?.data, name: 'bulk' });
		const outcome = await bulkArticles(ctx, value);
		if (outcome.ok) return { bulk: outcome.value };
		const { message, fields = {}, reason } = outcome;
		return fail(statusOf(reason), { refused: { typed, message, fields }, name: 'bulk' });
	}),
	keep: guarded('article.read', async ({ request }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, viewSave);
		if (value === undefined) return fail(422, { ...refused?.data, name: 'keep' });
		const outcome = await keepView(ctx, value);
		if (outcome.ok) redirect(303, `/desk/articles?${outcome.value.query}`);
		const { message, fields = {}, reason } = outcome;
		return fail(statusOf(reason), { refused: { typed, message, fields }, name: 'keep' });
	}),
	forget: guarded('article.read', async ({ request }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, viewForget);
		if (value === undefined) return fail(422, { ...refused?.data, name: 'forget' });
		const outcome = await forgetView(ctx, value);
		if (outcome.ok) redirect(303, '/desk/articles');
		return fail(statusOf(outcome.reason), {
			refused: { typed, message: outcome.message, fields: {} },
			name: 'forget'
		});
	})
};
