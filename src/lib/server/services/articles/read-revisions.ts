import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { RevisionsQuery, Side } from '../../../schemas/article';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import * as editions from '../../db/queries/edition';
import * as revisions from '../../db/queries/revision';
import { compareOnPage, textsOf } from './compare-texts';

const perPage = 50;

/** Of two revisions the earlier comes first, however they were chosen; against an edition the order is as asked. */
function sidesOf({ from, to }: RevisionsQuery, head: number): { from: Side; to: Side } {
	const after = to ?? { kind: 'revision', number: head };
	const before = from ?? { kind: 'revision', number: Math.max(1, after.number - 1) };
	const swapped = before.kind === 'revision' && after.kind === 'revision' && before.number > after.number;
	return swapped ? { from: after, to: before } : { from: before, to: after };
}

/** The revisions of an article, a page of them, and the two that were asked for, compared in the source or on the page. */
export async function readRevisions(ctx: Context, slug: string, wanted: RevisionsQuery) {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const found = await articles.bySlug(ctx.db, slug);
	if (!found) return refuse('not_found', 'There is no such article.');
	const { article } = found;
	const filter = { named: wanted.named, words: wanted.q };
	const [list, total, printed, texts] = await Promise.all([
		revisions.list(ctx.db, article.id, filter, { limit: perPage, offset: (wanted.page - 1) * perPage }),
		revisions.countOf(ctx.db, article.id, filter),
		editions.listOf(ctx.db, article.id),
		textsOf(ctx, article, sidesOf(wanted, article.head))
	]);
	if (!texts.ok) return texts;
	const { before, after } = texts.value;
	const sameText = before.kind === after.kind && before.number === after.number;
	const onPage =
		wanted.view === 'page' && !sameText ? await compareOnPage(ctx, article, texts.value, wanted.all) : null;
	return done({
		article,
		list,
		total,
		pages: Math.max(1, Math.ceil(total / perPage)),
		editions: printed.map(({ number, publishedAt, approvedAt }) => ({ number, publishedAt, approvedAt })),
		before: { ...before, page: undefined },
		after: { ...after, page: undefined },
		sameText,
		blocks: onPage?.blocks ?? null,
		changes: onPage?.changes ?? null,
		mayEdit: may(ctx.actor, 'article.edit', { authorId: article.authorId })
	});
}
