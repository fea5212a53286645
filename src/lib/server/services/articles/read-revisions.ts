import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as revisions from '../../db/queries/revision';

const perPage = 50;

/** The revisions of an article, a page of them, and the two that were asked for with their texts. */
export async function readRevisions(
	ctx: Context,
	slug: string,
	wanted: { page: number; from: number | null; to: number | null }
) {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { article } = found;
	const to = wanted.to ?? article.head;
	const from = wanted.from ?? Math.max(1, to - 1);
	const [list, total, texts] = await Promise.all([
		revisions.list(ctx.db, article.id, { limit: perPage, offset: (wanted.page - 1) * perPage }),
		revisions.countOf(ctx.db, article.id),
		revisions.byNumbers(ctx.db, article.id, [...new Set([from, to])])
	]);
	const textOf = (number: number) => texts.find((one) => one.number === number);
	const older = textOf(Math.min(from, to));
	const newer = textOf(Math.max(from, to));
	if (!older || !newer) return refuse('not_found', 'There is no such revision of this article.');
	return done({
		article,
		list,
		pages: Math.max(1, Math.ceil(total / perPage)),
		older,
		newer,
		mayEdit: may(ctx.actor, 'article.edit', { authorId: article.authorId })
	});
}
