import type { ArticleData } from '../../../domain/articles/data';
import { kindOf } from '../../../domain/articles/kinds';
import { plateKey, type PlateSpec } from '../../../domain/articles/plates/spec';
import { renderArticle } from '../../../domain/articles/render-article';
import { after } from '../../../domain/articles/stage';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as campaigns from '../../db/queries/campaign-choice';
import * as revisions from '../../db/queries/revision';
import { plateDrawing } from '../../rendering/plate-cache';
import { sanitisePage } from '../../rendering/sanitise-page';
import { articleData } from './article-data';
import { withPictures } from './known-pictures';

/** The page of a source as it would be printed now, sanitised, with the drawings of its plates by key. */
export function renderNow(slug: string, source: string, data: ArticleData) {
	const drawings: Record<string, string> = {};
	const draw = (spec: PlateSpec) => (drawings[plateKey(spec)] = plateDrawing(spec));
	const rendered = renderArticle(source, data, draw, { platesAt: `/desk/articles/${slug}/plates/` });
	return { rendered, html: sanitisePage(rendered.html), drawings };
}

/** An article opened in the editor: its newest text, the data it can name, its page, and what the actor may do to it. */
export async function openArticle(ctx: Context, slug: string) {
	if (!may(ctx.actor, 'article.read'))
		return refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { article, authorName } = found;
	const [head, bound] = await Promise.all([
		revisions.byNumber(ctx.db, article.id, article.head),
		articles.campaignsOf(ctx.db, article.id)
	]);
	if (!head) throw new Error(`Article ${article.id} has no revision ${article.head}.`);
	const measured = await articleData(
		ctx,
		bound.map((one) => one.id)
	);
	const data = await withPictures(ctx.db, measured, head.source);
	const { html, drawings, rendered } = renderNow(slug, head.source, data);
	const allowed = may(ctx.actor, 'article.edit', { authorId: article.authorId });
	return done({
		article,
		kind: kindOf(article.template),
		authorName,
		head,
		campaigns: bound.map(({ slug: name, name: title }) => ({ slug: name, name: title })),
		choices: allowed ? await campaigns.open(ctx.db) : [],
		data,
		html,
		drawings,
		wordCount: rendered.wordCount,
		mayEdit: allowed && after(article.stage, 'edit') !== null,
		maySubmit:
			may(ctx.actor, 'article.submit', { authorId: article.authorId }) &&
			after(article.stage, 'submit') !== null,
		isOwn: article.authorId === ctx.actor.id
	});
}
