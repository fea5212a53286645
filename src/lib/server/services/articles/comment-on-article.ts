import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CommentInput, CommentResolve } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as audit from '../../db/queries/audit';
import * as comments from '../../db/queries/comment';

/** Hangs a comment on a passage of the newest revision, on the article as a whole, or under another comment. */
export async function commentOnArticle(
	ctx: Context,
	slug: string,
	input: CommentInput
): Promise<Outcome<{ id: number }, 'not_found' | 'forbidden'>> {
	if (!may(ctx.actor, 'article.comment')) return refuse('forbidden', 'Your roles do not include comments.');
	return inTransaction(ctx.db, async (tx) => {
		const row = await articles.lockBySlug(tx, slug);
		if (!row) return refuse('not_found', 'There is no such article.');
		const parent = input.parent === null ? undefined : await comments.byId(tx, row.id, input.parent);
		if (input.parent !== null && !parent)
			return refuse('not_found', 'The comment you answered is not on this article.');
		const id = await comments.insert(tx, {
			articleId: row.id,
			revisionNumber: row.head,
			quote: parent ? '' : input.quote,
			body: input.body,
			blocking: !parent && input.blocking,
			// One level: an answer to an answer hangs on the same comment.
			parentId: parent ? (parent.parentId ?? parent.id) : null,
			authorId: ctx.actor.id,
			createdAt: ctx.now
		});
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'article.comment',
				subjectKind: 'article',
				subjectId: row.id,
				after: { comment: id, blocking: !parent && input.blocking }
			}
		]);
		return done({ id });
	});
}

/** Resolves a comment, or opens it again: an editor, the article's author, or whoever wrote the comment. */
export async function resolveComment(
	ctx: Context,
	slug: string,
	input: CommentResolve
): Promise<Outcome<{ resolved: boolean }, 'not_found' | 'forbidden'>> {
	return inTransaction(ctx.db, async (tx) => {
		const row = await articles.lockBySlug(tx, slug);
		if (!row || !may(ctx.actor, 'article.read')) return refuse('not_found', 'There is no such article.');
		const comment = await comments.byId(tx, row.id, input.comment);
		if (!comment) return refuse('not_found', 'There is no such comment on this article.');
		const allowed =
			may(ctx.actor, 'article.resolve', { authorId: row.authorId }) ||
			(comment.authorId === ctx.actor.id && may(ctx.actor, 'article.comment'));
		if (!allowed)
			return refuse(
				'forbidden',
				'A comment is resolved by an editor, by the author, or by whoever wrote it.'
			);
		if ((comment.resolvedAt !== null) === input.resolved) return done({ resolved: input.resolved });
		await comments.setResolved(
			tx,
			comment.id,
			input.resolved
				? { resolvedAt: ctx.now, resolvedBy: ctx.actor.id }
				: { resolvedAt: null, resolvedBy: null }
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: input.resolved ? 'article.resolve-comment' : 'article.reopen-comment',
				subjectKind: 'article',
				subjectId: row.id,
				after: { comment: comment.id }
			}
		]);
		return done({ resolved: input.resolved });
	});
}
