import { done, refuse } from '../../../domain/shared/outcome';
import type { OpenContext } from '../../context';
import * as published from '../../db/queries/published';

export const articlesOnPage = 24;

/** Published articles, the newest first, a page at a time. */
export async function listArticles(
	ctx: OpenContext,
	{ page, template }: { page: number; template?: string }
) {
	const [rows, total] = await Promise.all([
		published.articles(ctx.db, { limit: articlesOnPage, offset: (page - 1) * articlesOnPage, template }),
		published.countArticles(ctx.db, template)
	]);
	return { rows, total, pages: Math.max(1, Math.ceil(total / articlesOnPage)) };
}

/** An article as it was printed, with its editions and what was put right since. A withdrawn one says why and shows nothing else. */
export async function readArticle(ctx: OpenContext, slug: string) {
	const found = await published.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const [editions, corrections] = await Promise.all([
		published.editionsOf(ctx.db, found.id),
		published.corrections(ctx.db, { articleId: found.id, limit: 100 })
	]);
	const { page, ...article } = found;
	return done({ article, page: found.withdrawnAt ? null : page, editions, corrections });
}

/** A plate of the printed edition, to download. */
export async function readPlate(ctx: OpenContext, slug: string, key: string) {
	const found = await published.plateOf(ctx.db, slug, key);
	return found && !found.withdrawnAt ? done(found) : refuse('not_found', 'There is no such plate.');
}

/** Parts that printed articles have results of. */
export const listParts = (ctx: OpenContext) => published.parts(ctx.db);

/** A part with everything printed about it; a part nobody wrote about is not there. */
export async function readPart(ctx: OpenContext, slug: string) {
	const part = await published.partBySlug(ctx.db, slug);
	if (!part) return refuse('not_found', 'We have published nothing about such a part.');
	const [prices, articles, results] = await Promise.all([
		published.pricesOf(ctx.db, part.id),
		published.articlesOfPart(ctx.db, part.id),
		published.resultsOfPart(ctx.db, part.id)
	]);
	return done({ part, prices, articles, results });
}

/** Workloads with printed results. */
export const listMethods = (ctx: OpenContext) => published.methods(ctx.db);

/** How a workload is run, with what was printed of it. */
export async function readMethod(ctx: OpenContext, slug: string) {
	const [workload, results] = await Promise.all([
		published.workloadBySlug(ctx.db, slug),
		published.resultsOfWorkload(ctx.db, slug)
	]);
	if (!workload || results.length === 0)
		return refuse('not_found', 'We have published nothing measured this way.');
	return done({ workload, results });
}

/** What was put right, the newest first. */
export const listCorrections = (ctx: OpenContext) => published.corrections(ctx.db, { limit: 200 });
