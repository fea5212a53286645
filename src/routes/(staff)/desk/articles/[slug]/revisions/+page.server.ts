import { fail, redirect } from '@sveltejs/kit';
import { revisionName, revisionRestore, revisionsQuery } from '$lib/schemas/article';
import { readListing } from '$lib/schemas/listing';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { nameRevision } from '$lib/server/services/articles/name-revision';
import { readRevisions } from '$lib/server/services/articles/read-revisions';
import { restoreRevision } from '$lib/server/services/articles/restore-revision';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('article.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const query = readListing(revisionsQuery, url.searchParams);
	const view = valueOrError(await readRevisions(ctx, params.slug, query));
	const { page, named, q, all } = query;
	return { title: `Revisions of ${view.article.title}`, page, named, q, all, view: query.view, ...view };
});

export const actions = {
	restore: guarded('article.edit', async ({ params, request }: RequestEvent, ctx) => {
		const read = revisionRestore.safeParse(Object.fromEntries(await request.formData()));
		if (!read.success) return fail(422, { message: 'That is no revision. Nothing was changed.' });
		const restored = await restoreRevision(ctx, params.slug, read.data);
		if (!restored.ok) return fail(statusOf(restored.reason), { message: restored.message });
		redirect(303, `/desk/articles/${params.slug}`);
	}),
	name: guarded('article.edit', async ({ params, request }: RequestEvent, ctx) => {
		const read = revisionName.safeParse(Object.fromEntries(await request.formData()));
		if (!read.success) {
			const [issue] = read.error.issues;
			return fail(422, { message: `${issue?.message ?? 'That is no name.'} Nothing was changed.` });
		}
		const named = await nameRevision(ctx, params.slug, read.data);
		if (!named.ok) return fail(statusOf(named.reason), { message: named.message });
		return {
			said: named.value.label === null ? 'The name is off.' : `It is called “${named.value.label}” now.`
		};
	})
};
