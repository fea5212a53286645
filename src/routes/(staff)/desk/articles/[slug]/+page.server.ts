import { fail, redirect } from '@sveltejs/kit';
import { campaignsChoice, plainMove, revisionSave } from '$lib/schemas/article';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { chooseCampaigns } from '$lib/server/services/articles/choose-campaigns';
import { openArticle } from '$lib/server/services/articles/open-article';
import { saveRevision } from '$lib/server/services/articles/save-revision';
import { submitArticle } from '$lib/server/services/articles/submit-article';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('article.read', async ({ params, url }: PageServerLoadEvent, ctx) => {
	const line = Number(url.searchParams.get('line'));
	const opened = valueOrError(await openArticle(ctx, params.slug));
	return {
		...opened,
		title: opened.article.title,
		personId: ctx.actor.id,
		startLine: line > 0 ? line : null
	};
});

export const actions = {
	/** The form without scripts. */
	save: guarded('article.edit', async ({ params, request }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, revisionSave);
		if (!value) return refused;
		const saved = await saveRevision(ctx, params.slug, value);
		if (saved.ok) redirect(303, `/desk/articles/${params.slug}`);
		const { message, reason, detail } = saved;
		return fail(statusOf(reason), { refused: { typed, message, fields: {} }, theirs: detail });
	}),
	submit: guarded('article.submit', async ({ params, request }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, plainMove);
		if (!value) return refused;
		const moved = await submitArticle(ctx, params.slug, value);
		if (moved.ok) redirect(303, `/desk/articles/${params.slug}/review`);
		return fail(statusOf(moved.reason), { refused: { typed, message: moved.message, fields: {} } });
	}),
	campaigns: guarded('article.edit', async ({ params, request }: RequestEvent, ctx) => {
		const posted = await request.formData();
		const read = campaignsChoice.safeParse({
			version: posted.get('version'),
			campaigns: posted.getAll('campaigns[]')
		});
		const message = read.error?.issues[0]?.message;
		if (!read.success)
			return fail(422, { refused: { typed: {}, message: message ?? 'Choose again.', fields: {} } });
		const chosen = await chooseCampaigns(ctx, params.slug, read.data);
		if (chosen.ok) redirect(303, `/desk/articles/${params.slug}`);
		return fail(statusOf(chosen.reason), { refused: { typed: {}, message: chosen.message, fields: {} } });
	})
};
