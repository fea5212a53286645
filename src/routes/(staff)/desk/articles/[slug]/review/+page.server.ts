import { fail, redirect } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Act } from '$lib/domain/people/policy';
import type { Outcome } from '$lib/domain/shared/outcome';
import * as schemas from '$lib/schemas/article';
import type { Context } from '$lib/server/context';
import { checkInput } from '$lib/schemas/template';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { statusOf } from '$lib/server/http/problem';
import { readPlainForm } from '$lib/server/http/read-plain-form';
import { approveArticle } from '$lib/server/services/articles/approve-article';
import { askChanges } from '$lib/server/services/articles/ask-changes';
import { checkItem } from '$lib/server/services/articles/check-item';
import { commentOnArticle, resolveComment } from '$lib/server/services/articles/comment-on-article';
import { correctArticle } from '$lib/server/services/articles/correct-article';
import { publishArticle } from '$lib/server/services/articles/publish-article';
import { readReview } from '$lib/server/services/articles/read-review';
import { keepAsPrinted, reviseArticle, rewordCorrection } from '$lib/server/services/articles/revise-article';
import { planSlot, scheduleArticle, unscheduleArticle } from '$lib/server/services/articles/schedule-article';
import { submitArticle } from '$lib/server/services/articles/submit-article';
import { withdrawArticle } from '$lib/server/services/articles/withdraw-article';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('article.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const review = valueOrError(await readReview(ctx, params.slug));
	return { title: `Review of ${review.article.title}`, now: ctx.now, ...review };
});

/** A form of this page: read through its schema, handed to its service, back here either way. */
const act = <S extends z.ZodType>(
	name: string,
	need: Act,
	schema: S,
	run: (ctx: Context, slug: string, value: z.output<S>) => Promise<Outcome<unknown>>
) =>
	guarded(need, async ({ params, request }: RequestEvent, ctx) => {
		const { typed, value, refused } = await readPlainForm(request, schema);
		if (value === undefined) return fail(422, { ...refused?.data, name });
		const outcome = await run(ctx, params.slug, value);
		if (outcome.ok) redirect(303, `/desk/articles/${params.slug}/review`);
		const { message, fields = {}, reason } = outcome;
		return fail(statusOf(reason), { refused: { typed, message, fields }, name });
	});

const { plainMove, changesAsk, slotChoice, correctionInput, withdrawal, commentInput, commentResolve } =
	schemas;

export const actions = {
	submit: act('submit', 'article.submit', plainMove, submitArticle),
	ask: act('ask', 'article.ask-changes', changesAsk, askChanges),
	approve: act('approve', 'article.approve', plainMove, approveArticle),
	plan: act('plan', 'article.schedule', slotChoice, planSlot),
	schedule: act('schedule', 'article.schedule', slotChoice, scheduleArticle),
	unschedule: act('unschedule', 'article.schedule', plainMove, unscheduleArticle),
	publish: act('publish', 'article.publish', plainMove, publishArticle),
	revise: act('revise', 'article.correct', correctionInput, reviseArticle),
	reword: act('reword', 'article.correct', correctionInput, rewordCorrection),
	keep: act('keep', 'article.correct', plainMove, keepAsPrinted),
	correct: act('correct', 'article.correct', correctionInput, correctArticle),
	withdraw: act('withdraw', 'article.withdraw', withdrawal, withdrawArticle),
	check: act('check', 'article.check', checkInput, checkItem),
	comment: act('comment', 'article.comment', commentInput, commentOnArticle),
	resolve: act('resolve', 'article.comment', commentResolve, resolveComment)
};
