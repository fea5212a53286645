import { after } from '../../../domain/articles/stage';
import * as mails from '../../../domain/mail/article-handover';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { ChangesAsk } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as comments from '../../db/queries/comment';
import * as handover from '../../db/queries/handover';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';
import { tell } from './tell';

/** Gives an article back to its author with what is to change, which also stands among the comments. */
export const askChanges = (
	ctx: Context,
	slug: string,
	{ version, words }: ChangesAsk
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.ask-changes',
			move: 'ask-changes',
			seen: version
		});
		if (!taken.ok) return taken;
		const row = taken.value;
		const moved = await moveTo(ctx, tx, row, {
			act: 'article.ask-changes',
			stage: after(row.stage, 'ask-changes'),
			change: { approvedEditionId: null },
			reason: words
		});
		await comments.insert(tx, {
			articleId: row.id,
			revisionNumber: row.head,
			quote: '',
			body: words,
			blocking: false,
			authorId: ctx.actor.id,
			createdAt: ctx.now
		});
		await tell(ctx, tx, row, `changes-asked.v${row.version}`, [
			{
				to: await handover.personById(tx, row.authorId),
				letter: (facts) => mails.changesAsked(facts, words)
			}
		]);
		return done(moved);
	});
