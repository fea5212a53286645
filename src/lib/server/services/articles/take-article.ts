import { closedWords, open, type Move } from '../../../domain/articles/stage';
import { actOf, judging } from '../../../domain/articles/moves';
import { may, type Act } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import type { Transaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as filing from '../../db/queries/article-filing';
import type { ArticleRow } from '../../db/queries/article';

export type TakeReason = 'not_found' | 'forbidden' | 'conflict';

/** Whether readers have a page of it. */
export const hasPage = (row: Pick<ArticleRow, 'liveEditionId' | 'withdrawnAt'>): boolean =>
	row.liveEditionId !== null && row.withdrawnAt === null;

/** The words of a refusal for somebody who may not do an act to an article. */
export function forbiddenWords(ctx: Context, act: Act, authorId: string): string {
	const own = authorId === ctx.actor.id;
	if (own && act === 'article.approve')
		return 'You wrote this article, so somebody else has to approve it. Nothing was changed.';
	if (own && act === 'article.ask-changes')
		return 'You wrote this article: change it, rather than ask yourself for changes.';
	if (act === 'article.edit' || act === 'article.submit')
		return 'Only its author and the editors can change this article.';
	return 'Only an editor can do this.';
}

/**
 * Locks an article for a move in the caller's transaction and checks, in this order, that it exists, that the
 * actor may do this to it, that nobody changed it since the version that was seen, and that its stage allows the move.
 */
export async function takeArticle(
	ctx: Context,
	tx: Transaction,
	wanted: { slug: string; act: Act; move: Move | null; seen: number }
): Promise<Outcome<ArticleRow, TakeReason>> {
	if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
	const row = await articles.lockBySlug(tx, wanted.slug);
	if (!row) return refuse('not_found', 'There is no such article.');
	if (!may(ctx.actor, wanted.act, { authorId: row.authorId }))
		return refuse('forbidden', forbiddenWords(ctx, wanted.act, row.authorId));
	const judges = judging.some((move) => actOf[move] === wanted.act);
	if (judges && (await filing.wasAuthor(tx, row.id, ctx.actor.id)))
		return refuse(
			'forbidden',
			'You wrote this article before you handed it on, so somebody else has to judge it. Nothing was changed.'
		);
	if (row.version !== wanted.seen)
		return refuse(
			'conflict',
			'Somebody changed this article after you opened it. Nothing was done; look at it as it is now and decide again.',
			{ detail: { version: row.version } }
		);
	if (wanted.move !== null && !open({ stage: row.stage, hasPage: hasPage(row) }, wanted.move))
		return refuse('conflict', closedWords(row.stage, wanted.move));
	return done(row);
}
