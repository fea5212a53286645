import { after } from '../../../domain/articles/stage';
import { slotFromLocal, slotWords } from '../../../domain/articles/slot';
import * as mails from '../../../domain/mail/article-handover';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PlainMove, SlotChoice } from '../../../schemas/article';
import type { Context } from '../../context';
import { inTransaction, type Transaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as settings from '../../db/queries/settings';
import { enqueue } from '../../jobs/queue';
import { checkEdition, stopWords } from './check-article';
import { moveTo } from './move-to';
import { takeArticle, type TakeReason } from './take-article';
import { tellReaders } from './tell-of-page';

type Reason = TakeReason | 'invalid';

const beside = (message: string) => refuse('invalid', message, { fields: { slot: [message] } });

/** A slot in the publication's zone that lies ahead. */
function readSlot(ctx: Context, local: string, zone: string): Outcome<Date, 'invalid'> {
	const read = slotFromLocal(local, zone);
	if (!read.ok) return beside(read.message);
	if (read.at <= ctx.now)
		return beside(`${slotWords(read.at, zone)} has passed. Choose a later time, or publish now.`);
	return done(read.at);
}

async function confirm(ctx: Context, tx: Transaction, row: ArticleRow, slot: Date, zone: string) {
	const moved = await moveTo(ctx, tx, row, {
		act: 'article.schedule',
		stage: after(row.stage, 'schedule'),
		change: { slotAt: slot }
	});
	const editionId = row.approvedEditionId;
	await enqueue(tx, ctx.now, [
		{
			kind: 'publish-article',
			payload: { articleId: row.id, editionId },
			runAt: slot,
			// By the article's version as well: a slot given up and taken again is another errand.
			dedupeKey: `publish-article:${row.id}:${editionId}:${slot.getTime()}:${row.version}`
		}
	]);
	await tellReaders(ctx, tx, row, `scheduled.v${row.version}`, {
		desk: (facts, capacity) => mails.scheduled(facts, slotWords(slot, zone), capacity)
	});
	return moved;
}

/**
 * Gives an approved article its slot, and queues its publication. Refused for a time that does not exist or has
 * passed, before an embargo ends, without the disclosures owed, and under a blocking comment, naming each.
 */
export const scheduleArticle = (
	ctx: Context,
	slug: string,
	{ version, slot: local }: SlotChoice
): Promise<Outcome<ArticleRow, Reason>> =>
	inTransaction(ctx.db, async (tx): Promise<Outcome<ArticleRow, Reason>> => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.schedule',
			move: 'schedule',
			seen: version
		});
		if (!taken.ok) return taken;
		const { zone } = await settings.publication(tx);
		const slot = readSlot(ctx, local, zone);
		if (!slot.ok) return slot;
		const stops = await checkEdition(ctx, tx, taken.value, slot.value, 'person');
		if (stops.length > 0)
			return refuse('invalid', stopWords('It cannot have this slot.', stops), {
				detail: stops,
				fields: { slot: stops.map((finding) => finding.message) }
			});
		return done(await confirm(ctx, tx, taken.value, slot.value, zone));
	});

/** Takes a scheduled article's slot away; it stays approved. What was queued for the slot finds nothing to do. */
export const unscheduleArticle = (
	ctx: Context,
	slug: string,
	{ version }: PlainMove
): Promise<Outcome<ArticleRow, TakeReason>> =>
	inTransaction(ctx.db, async (tx) => {
		const taken = await takeArticle(ctx, tx, {
			slug,
			act: 'article.schedule',
			move: 'unschedule',
			seen: version
		});
		if (!taken.ok) return taken;
		const row = taken.value;
		const moved = await moveTo(ctx, tx, row, {
			act: 'article.unschedule',
			stage: after(row.stage, 'unschedule'),
			change: { slotAt: null }
		});
		await tellReaders(ctx, tx, row, `unscheduled.v${row.version}`, { desk: mails.unscheduled });
		return done(moved);
	});

/** Plans a slot for an article that is not approved yet, or drops the plan: a wish, which the preflight holds against embargoes. */
export const planSlot = (
	ctx: Context,
	slug: string,
	{ version, slot: local }: SlotChoice
): Promise<Outcome<ArticleRow, Reason>> =>
	inTransaction(ctx.db, async (tx): Promise<Outcome<ArticleRow, Reason>> => {
		const taken = await takeArticle(ctx, tx, { slug, act: 'article.schedule', move: null, seen: version });
		if (!taken.ok) return taken;
		const row = taken.value;
		if (!['drafting', 'in-review', 'changes-asked', 'approved'].includes(row.stage))
			return refuse(
				'conflict',
				'A slot is planned while an article is being worked on. Nothing was changed.'
			);
		const { zone } = await settings.publication(tx);
		const slot = local === '' ? done(null) : readSlot(ctx, local, zone);
		if (!slot.ok) return slot;
		return done(
			await moveTo(ctx, tx, row, {
				act: 'article.plan-slot',
				stage: row.stage,
				change: { slotAt: slot.value }
			})
		);
	});
