import { after } from '../../../domain/articles/stage';
import * as mails from '../../../domain/mail/article-handover';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { Withdrawal } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as corrections from '../../db/queries/correction';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';
import { tellReaders } from './tell-of-page';

/** Takes a printed page away: readers see the reason in its place, and the corrections list it. */
export const withdrawArticle = (
	ctx: Context,
	slug: string,
	{ version, reason }: Withdrawal
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.withdraw',
			move: 'withdraw',
			seen: version
		});
		if (!taken.ok) return taken;
		const row = taken.value;
		const moved = await moveTo(ctx, tx, row, {
			act: 'article.withdraw',
			stage: after(row.stage, 'withdraw'),
			change: {
				withdrawnAt: ctx.now,
				withdrawReason: reason,
				slotAt: null,
				approvedEditionId: null,
				nextCorrectionKind: null,
				nextCorrectionBody: null
			},
			reason
		});
		await corrections.insert(tx, {
			articleId: row.id,
			editionId: row.liveEditionId,
			kind: 'withdrawal',
			body: reason,
			madeBy: ctx.actor.id,
			madeAt: ctx.now
		});
		await tellReaders(ctx, tx, row, `withdrawn.v${row.version}`, {
			desk: (facts, capacity) => mails.withdrawn(facts, reason, capacity),
			liaison: mails.withdrawnForLiaison
		});
		return done(moved);
	});
