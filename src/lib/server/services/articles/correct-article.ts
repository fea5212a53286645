import * as mails from '../../../domain/mail/article-handover';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CorrectionInput } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import * as audit from '../../db/queries/audit';
import * as corrections from '../../db/queries/correction';
import { hasPage, takeArticle, type TakeReason } from './take-article';
import { tellReaders } from './tell-of-page';

/** Lists a correction on a printed page whose text stays, such as a note about a figure; dated now, never removed. */
export const correctArticle = (
	ctx: Context,
	slug: string,
	{ version, kind, body }: CorrectionInput
): Promise<Outcome<{ id: number }, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, { slug, act: 'article.correct', move: null, seen: version });
		if (!taken.ok) return taken;
		const row = taken.value;
		if (!hasPage(row))
			return refuse('conflict', 'Readers have no page of this article yet, so there is nothing to correct.');
		const id = await corrections.insert(tx, {
			articleId: row.id,
			editionId: row.liveEditionId,
			kind,
			body,
			madeBy: ctx.actor.id,
			madeAt: ctx.now
		});
		// The same form sent twice finds another version and is refused.
		await articles.update(tx, row.id, row.version, { updatedAt: ctx.now });
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'article.correct',
				subjectKind: 'article',
				subjectId: row.id,
				after: { correction: id, kind },
				reason: body
			}
		]);
		await tellReaders(ctx, tx, row, `corrected.c${id}`, {
			desk: (facts, capacity) => mails.corrected(facts, body, capacity)
		});
		return done({ id });
	});
