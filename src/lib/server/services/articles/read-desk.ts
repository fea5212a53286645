import { addProgress, beforePrint, benchWords, type BenchProgress } from '../../../domain/articles/desk-row';
import { fortnight, fortnightSpan } from '../../../domain/articles/fortnight';
import { stages, type Stage } from '../../../domain/articles/stage';
import { inDateOrder, toChange, toReview, toSchedule, toSign } from '../../../domain/articles/waiting';
import { may } from '../../../domain/people/policy';
import { done, refuse } from '../../../domain/shared/outcome';
import type { DeskFilter } from '../../../schemas/article';
import type { Context } from '../../context';
import * as progress from '../../db/queries/campaign-progress';
import * as calendar from '../../db/queries/desk-calendar';
import * as desk from '../../db/queries/desk-list';
import * as waits from '../../db/queries/desk-waits';
import * as settings from '../../db/queries/settings';

const perPage = 20;
const dayMs = 86_400_000;

const isStage = (text: string): text is Stage => (stages as readonly string[]).includes(text);

/** What waits for the actor, by their roles, in date order. */
async function waitingFor(ctx: Context, zone: string) {
	const { actor, db, now } = ctx;
	const edits = actor.roles.includes('editor');
	const tests = actor.roles.includes('tester');
	const [forEditor, forAuthor, forTester] = await Promise.all([
		edits ? waits.forEditor(db, actor.id) : [],
		waits.forAuthor(db, actor.id),
		tests ? waits.forTester(db, actor.id, new Date(now.getTime() - 30 * dayMs)) : []
	]);
	const ids = forEditor.map((card) => card.id);
	const [blocks, embargoes] = await Promise.all([desk.openBlocksOf(db, ids), desk.embargoesOf(db, ids, now)]);
	const blocksOf = new Map(blocks.map((one) => [one.articleId, one.blocks]));
	const embargoOf = new Map(embargoes.map((one) => [one.articleId, one]));
	return inDateOrder([
		...forEditor.map((card) =>
			card.stage === 'approved'
				? toSchedule(card, embargoOf.get(card.id), now, zone)
				: toReview(card, blocksOf.get(card.id) ?? 0, now)
		),
		...forAuthor.map((card) => toChange(card, card.comments, now)),
		...forTester.map((campaign) => toSign(campaign, now))
	]);
}

/** Everything in progress, a page of it, with how far the bench is and what stands before print. */
async function inProgress(ctx: Context, filter: DeskFilter) {
	const stage = isStage(filter.stage) ? filter.stage : null;
	const { rows, total } = await desk.list(
		ctx.db,
		{
			stage,
			text: filter.q || undefined,
			sort: filter.sort,
			authorId: filter.mine ? ctx.actor.id : undefined
		},
		{ limit: perPage, offset: (filter.page - 1) * perPage }
	);
	const ids = rows.map((row) => row.id);
	const [bound, blocks, embargoes] = await Promise.all([
		desk.campaignsOf(ctx.db, ids),
		desk.openBlocksOf(ctx.db, ids),
		desk.embargoesOf(ctx.db, ids, ctx.now)
	]);
	const far = await progress.ofCampaigns(ctx.db, [...new Set(bound.map((one) => one.campaignId))]);
	const benchOf = (articleId: number): BenchProgress =>
		addProgress(
			bound
				.filter((one) => one.articleId === articleId)
				.flatMap(({ campaignId }) => {
					const one = far.get(campaignId);
					return one
						? [
								{
									cells: one.profiles * one.workloads,
									signed: one.signed,
									needed: one.needed,
									taken: one.taken
								}
							]
						: [];
				})
		);
	const blocksOf = new Map(blocks.map((one) => [one.articleId, one.blocks]));
	const embargoOf = new Map(embargoes.map((one) => [one.articleId, one]));
	return {
		total,
		pages: Math.max(1, Math.ceil(total / perPage)),
		rows: rows.map((row) => {
			const bench = benchOf(row.id);
			return {
				slug: row.slug,
				title: row.title,
				stage: row.stage,
				slotAt: row.slotAt,
				authorName: row.authorName,
				isNewEdition: row.firstPublishedAt !== null && row.stage !== 'published' && row.stage !== 'withdrawn',
				bench: benchWords(bench),
				print: beforePrint({
					stage: row.stage,
					slotAt: row.slotAt,
					bench,
					blockingComments: blocksOf.get(row.id) ?? 0,
					embargoUntil: embargoOf.get(row.id)?.until ?? null
				})
			};
		})
	};
}

/** Two weeks of slots, publications, embargoes and, for those who may know, loans due back. */
async function twoWeeks(ctx: Context, zone: string) {
	const span = fortnightSpan(ctx.now, zone);
	const [slots, printed, embargoes, loans] = await Promise.all([
		calendar.slots(ctx.db, span),
		calendar.printed(ctx.db, span),
		calendar.embargoes(ctx.db, span),
		may(ctx.actor, 'loan.duties') ? calendar.loansDue(ctx.db, span.firstDay, span.endDay) : []
	]);
	return fortnight(ctx.now, zone, [
		...printed.map(({ at, title, slug, number }) => ({
			kind: 'published' as const,
			at,
			title: number > 1 ? `${title}, edition ${number}` : title,
			href: `/desk/articles/${slug}/review`
		})),
		...slots.map(({ at, title, slug, stage }) => ({
			kind: stage === 'scheduled' ? ('scheduled' as const) : ('planned' as const),
			at,
			title,
			href: `/desk/articles/${slug}/review`
		})),
		...embargoes.map(({ at, maker, model }) => ({
			kind: 'embargo' as const,
			at,
			title: `embargo lifts, ${maker} ${model}`,
			href: null
		})),
		...loans.map(({ dueOn, maker, model }) => ({
			kind: 'loan' as const,
			at: null,
			day: dueOn ?? undefined,
			title: `${maker} ${model} due back`,
			href: null
		}))
	]);
}

/** The Desk: what waits for the actor, what is in progress, and the fortnight. A fixed number of queries. */
export async function readDesk(ctx: Context, filter: DeskFilter) {
	if (!may(ctx.actor, 'article.read'))
		return refuse('forbidden', 'Your roles do not include the desk: drafts are not for the liaison.');
	const publication = await settings.publication(ctx.db);
	const { zone } = publication;
	const [waiting, progressList, days] = await Promise.all([
		waitingFor(ctx, zone),
		inProgress(ctx, filter),
		twoWeeks(ctx, zone)
	]);
	return done({
		zone,
		now: ctx.now,
		waiting,
		inProgress: progressList,
		days,
		mayStart: may(ctx.actor, 'article.create')
	});
}
