import { after, closedWords } from '../../../domain/articles/stage';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import { forbiddenWords } from './take-article';

/** An article that a file is to be saved over, with the revision it would follow. */
export async function readForImport(ctx: Context, slug: string) {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { title, head, stage, authorId } = found.article;
	if (!may(ctx.actor, 'article.edit', { authorId }))
		return refuse('forbidden', forbiddenWords(ctx, 'article.edit', authorId));
	return done({ slug, title, head, closed: after(stage, 'edit') ? null : closedWords(stage, 'edit') });
}
