import { after } from '../../../domain/articles/stage';
import * as mails from '../../../domain/mail/article-handover';
import { done, type Outcome } from '../../../domain/shared/outcome';
import type { PlainMove } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as handover from '../../db/queries/handover';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';
import { tell } from './tell';

/** Hands an article to the editors, who are told. Findings do not hold it back here: they hold the approval back. */
export const submitArticle = (
	ctx: Context,
	slug: string,
	{ version }: PlainMove
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, { slug, act: 'article.submit', move: 'submit', seen: version });
		if (!taken.ok) return taken;
		const row = taken.value;
		const moved = await moveTo(ctx, tx, row, { act: 'article.submit', stage: after(row.stage, 'submit') });
		await tell(ctx, tx, row, `submitted.v${row.version}`, [
			{
				to: await handover.withRole(tx, 'editor'),
				letter: (facts) => mails.submitted(facts, { again: row.stage === 'changes-asked' })
			}
		]);
		return done(moved);
	});
