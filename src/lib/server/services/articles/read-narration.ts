import { scriptOf } from '../../../domain/articles/narration/script';
import { renderArticle } from '../../../domain/articles/render-article';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as revisions from '../../db/queries/revision';
import { currentData } from './check-article';

/** The newest text of an article as a script for speaking, and the plates it shows. */
export async function readNarration(ctx: Context, slug: string) {
	if (!may(ctx.actor, 'article.read'))
		return refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');
	const found = await articles.bySlug(ctx.db, slug);
	const head = found && (await revisions.byNumber(ctx.db, found.article.id, found.article.head));
	if (!found || !head) return refuse('not_found', 'There is no such article.');
	const data = await currentData(ctx, ctx.db, found.article.id);
	const { plates } = renderArticle(head.source, data, () => '');
	return done({
		slug,
		title: head.title,
		revision: head.number,
		stage: found.article.stage,
		script: scriptOf(head, data),
		plates: plates.map(({ key, spec }) => ({ key, title: spec.title }))
	});
}
