import { after } from '../../../domain/articles/stage';
import { slotWords } from '../../../domain/articles/slot';
import * as mails from '../../../domain/mail/article-handover';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PlainMove } from '../../../schemas/article';
import type { Context, SystemContext } from '../../context';
import { inTransaction, type Transaction } from '../../db/client';
import * as articles from '../../db/queries/article';
import type { ArticleRow } from '../../db/queries/article';
import * as corrections from '../../db/queries/correction';
import * as editions from '../../db/queries/edition';
import * as handover from '../../db/queries/handover';
import * as settings from '../../db/queries/settings';
import { checkEdition, stopWords } from './check-article';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';
import { tellReaders } from './tell-of-page';
import { tell } from './tell';

type Acting = SystemContext & { actor?: { id: string; name: string } };

/** Makes the approved edition the one readers have, lists what readers are told about it, and tells those it concerns. */
async function print(ctx: Acting, tx: Transaction, row: ArticleRow): Promise<ArticleRow> {
	const edition = row.approvedEditionId === null ? undefined : await editions.byId(tx, row.approvedEditionId);
	if (!edition) throw new Error(`Article ${row.id} is ${row.stage} and has no approved edition.`);
	if (!(await editions.markPublished(tx, edition.id, ctx.now)))
		throw new Error(`Edition ${edition.id} was printed before.`);
	if (row.nextCorrectionKind !== null && row.nextCorrectionBody !== null)
		await corrections.insert(tx, {
			articleId: row.id,
			editionId: edition.id,
			kind: row.nextCorrectionKind,
			body: row.nextCorrectionBody,
			madeBy: ctx.actor?.id ?? edition.approvedBy,
			madeAt: ctx.now
		});
	const again = row.firstPublishedAt !== null;
	const moved = await moveTo(ctx, tx, row, {
		act: 'article.publish',
		stage: after(row.stage, 'publish'),
		change: {
			liveEditionId: edition.id,
			approvedEditionId: null,
			firstPublishedAt: row.firstPublishedAt ?? ctx.now,
			slotAt: null,
			withdrawnAt: null,
			withdrawReason: null,
			nextCorrectionKind: null,
			nextCorrectionBody: null
		},
		log: { edition: edition.number, hash: edition.hash }
	});
	await tellReaders(ctx, tx, row, `published.e${edition.id}`, {
		desk: (facts, capacity) => mails.published(facts, { edition: edition.number, again }, capacity),
		liaison: mails.publishedForLiaison
	});
	return moved;
}

/** Publishes an approved or scheduled article at once, under the same checks as a slot. */
export const publishArticle = (
	ctx: Context,
	slug: string,
	{ version }: PlainMove
): Promise<Outcome<ArticleRow, TakeReason | 'invalid'>> =>
	inTransaction(ctx.db, async (tx): Promise<Outcome<ArticleRow, TakeReason | 'invalid'>> => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.publish',
			move: 'publish',
			seen: version
		});
		if (!taken.ok) return taken;
		const stops = await checkEdition(ctx, tx, taken.value, ctx.now, 'person');
		if (stops.length > 0)
			return refuse('invalid', stopWords('It cannot be published now.', stops), { detail: stops });
		return done(await print(ctx, tx, taken.value));
	});

/** What a due slot came to. */
export type SlotOutcome = 'published' | 'stopped' | 'nothing-to-do';

/**
 * Publishes an article whose slot has come, as the schedule. Safe to run any number of times, by any number of
 * processes: under the row's lock it acts only while this edition is scheduled and its slot has come. Where an
 * embargo or a disclosure stands in the way it prints nothing, takes the slot away and tells the editors and the author.
 */
export const publishDue = (
	ctx: SystemContext,
	{ articleId, editionId }: { articleId: number; editionId: number }
): Promise<SlotOutcome> =>
	inTransaction(ctx.db, async (tx): Promise<SlotOutcome> => {
		const row = await articles.lock(tx, articleId);
		if (row?.stage !== 'scheduled' || row.approvedEditionId !== editionId) return 'nothing-to-do';
		if (row.slotAt === null || row.slotAt > ctx.now) return 'nothing-to-do';
		const stops = await checkEdition(ctx, tx, row, ctx.now, 'schedule');
		if (stops.length === 0) {
			await print(ctx, tx, row);
			return 'published';
		}
		await stop(
			ctx,
			tx,
			row,
			row.slotAt,
			stops.map((finding) => finding.message)
		);
		return 'stopped';
	});

async function stop(ctx: SystemContext, tx: Transaction, row: ArticleRow, slot: Date, reasons: string[]) {
	const { zone } = await settings.publication(tx);
	await moveTo(ctx, tx, row, {
		act: 'article.not-published',
		stage: after(row.stage, 'unschedule'),
		change: { slotAt: null },
		reason: reasons.join(' ')
	});
	await tell(ctx, tx, row, `not-published.v${row.version}`, [
		{
			to: await handover.withRole(tx, 'editor'),
			letter: (facts) => mails.notPublished(facts, slotWords(slot, zone), reasons, 'editor')
		},
		{
			to: await handover.personById(tx, row.authorId),
			letter: (facts) => mails.notPublished(facts, slotWords(slot, zone), reasons, 'author')
		}
	]);
}
