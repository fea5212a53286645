import { after } from '../../../domain/articles/stage';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { CorrectionInput, PlainMove } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';

/**
 * Opens a new edition of a printed article. What readers will be told is said now and listed when the edition goes
 * out; until then the page stays as it is.
 */
export const reviseArticle = (
	ctx: Context,
	slug: string,
	{ version, kind, body }: CorrectionInput
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, { slug, act: 'article.correct', move: 'revise', seen: version });
		if (!taken.ok) return taken;
		const row = taken.value;
		return done(
			await moveTo(ctx, tx, row, {
				act: 'article.revise',
				stage: after(row.stage, 'revise'),
				change: {
					approvedEditionId: null,
					slotAt: null,
					nextCorrectionKind: kind,
					nextCorrectionBody: body
				},
				reason: body,
				log: { kind }
			})
		);
	});

/** Changes what readers will be told when the new edition goes out. */
export const rewordCorrection = (
	ctx: Context,
	slug: string,
	{ version, kind, body }: CorrectionInput
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, { slug, act: 'article.correct', move: null, seen: version });
		if (!taken.ok) return taken;
		const row = taken.value;
		if (!row.nextCorrectionKind)
			return refuse(
				'conflict',
				'No new edition of this article is being written. List a correction instead.'
			);
		return done(
			await moveTo(ctx, tx, row, {
				act: 'article.reword-correction',
				stage: row.stage,
				change: { nextCorrectionKind: kind, nextCorrectionBody: body },
				reason: body,
				log: { kind }
			})
		);
	});

/** Gives a new edition up: the page stays as printed, the text written for it stays among the revisions. */
export const keepAsPrinted = (
	ctx: Context,
	slug: string,
	{ version }: PlainMove
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, { slug, act: 'article.correct', move: 'keep', seen: version });
		if (!taken.ok) return taken;
		const row = taken.value;
		return done(
			await moveTo(ctx, tx, row, {
				act: 'article.keep',
				stage: after(row.stage, 'keep'),
				change: {
					approvedEditionId: null,
					slotAt: null,
					nextCorrectionKind: null,
					nextCorrectionBody: null
				}
			})
		);
	});
