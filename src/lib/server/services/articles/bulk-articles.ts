import { handedOver } from '../../../domain/mail/article-handover';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { ArticlesBulk } from '../../../schemas/article-list';
import type { Context } from '../../context';
import { inTransaction, type Transaction } from '../../db/client';
import type { ArticleRow } from '../../db/queries/article';
import * as filing from '../../db/queries/article-filing';
import * as list from '../../db/queries/article-list';
import * as audit from '../../db/queries/audit';
import type { Recipient } from '../../db/queries/handover';
import * as settings from '../../db/queries/settings';
import { post } from '../../jobs/outbox';

/** What came of it: how many changed, and which did not, each with why. */
export interface BulkDone {
	changed: number;
	kept: { title: string; why: string }[];
}

type Bulk<A extends ArticlesBulk['act']> = Extract<ArticlesBulk, { act: A }>;

const why = (rows: ArticleRow[], words: string) => rows.map(({ title }) => ({ title, why: words }));
const split = <T>(rows: T[], test: (row: T) => boolean): [T[], T[]] => [
	rows.filter(test),
	rows.filter((row) => !test(row))
];
const entry = (ctx: Context, act: string, row: ArticleRow, before: unknown, after: unknown) => ({
	at: ctx.now,
	actorId: ctx.actor.id,
	act,
	subjectKind: 'article' as const,
	subjectId: row.id,
	before: before as Record<string, unknown>,
	after: after as Record<string, unknown>
});

async function file(
	ctx: Context,
	tx: Transaction,
	rows: ArticleRow[],
	{ act, tag }: Bulk<'tag' | 'untag'>
): Promise<BulkDone> {
	const carries = await filing.withTag(
		tx,
		rows.map((row) => row.id),
		tag
	);
	const [todo, same] = split(rows, (row) => carries.has(row.id) === (act === 'untag'));
	const ids = todo.map((row) => row.id);
	if (ids.length > 0) {
		await (act === 'tag' ? filing.addTag(tx, ids, tag) : filing.removeTag(tx, ids, tag));
		const [before, after] = act === 'tag' ? [{}, { tag }] : [{ tag }, {}];
		await audit.append(
			tx,
			todo.map((row) => entry(ctx, `article.${act}`, row, before, after))
		);
	}
	return {
		changed: ids.length,
		kept: why(same, act === 'tag' ? `has the tag “${tag}” already` : `has no tag “${tag}”`)
	};
}

const movable: ReadonlySet<ArticleRow['stage']> = new Set(['drafting', 'changes-asked', 'in-review']);

/** One mail for all of them; who takes something over from themselves is told nothing. */
async function tellTaker(ctx: Context, tx: Transaction, rows: ArticleRow[], taker: Recipient): Promise<void> {
	const [first] = rows;
	if (!first || taker.id === ctx.actor.id) return;
	const { name: publication } = await settings.publication(tx);
	const letter = handedOver({
		by: ctx.actor.name,
		titles: rows.map((row) => row.title),
		href: `${ctx.origin}/desk/articles?writer=${taker.id}`,
		publication
	});
	const messageId = `article-${first.id}.hand-over.v${first.version}.${taker.id}@${new URL(ctx.origin).hostname}`;
	await post(tx, ctx.now, [{ messageId, recipient: taker.email, ...letter }]);
}

async function handOver(
	ctx: Context,
	tx: Transaction,
	rows: ArticleRow[],
	{ person }: Bulk<'hand-over'>
): Promise<Outcome<BulkDone, 'invalid'>> {
	const taker = (await list.canWrite(tx)).find((one) => one.id === person);
	if (!taker)
		return refuse('invalid', 'This person does not write or edit here.', {
			fields: { person: ['Choose somebody who writes or edits here.'] }
		});
	const [foreign, own] = split(rows, (row) => row.authorId !== person);
	const [todo, fixed] = split(foreign, (row) => movable.has(row.stage));
	if (todo.length > 0) {
		await filing.giveTo(tx, todo, person, ctx.actor.id, ctx.now);
		await audit.append(
			tx,
			todo.map((row) => entry(ctx, 'article.hand-over', row, { author: row.authorId }, { author: person }))
		);
		await tellTaker(ctx, tx, todo, taker);
	}
	return done({
		changed: todo.length,
		kept: [
			...why(own, `is ${taker.name}’s already`),
			...why(fixed, 'is approved or printed: its byline is part of its edition')
		]
	});
}

/**
 * Does one thing to several articles at once. Those that the actor may not change, or that are so already, stay as
 * they are and are named; the rest change together or not at all.
 */
export const bulkArticles = (
	ctx: Context,
	input: ArticlesBulk
): Promise<Outcome<BulkDone, 'forbidden' | 'invalid'>> =>
	inTransaction(ctx.db, async (tx) => {
		if (!may(ctx.actor, 'article.read')) return refuse('forbidden', 'Your roles do not include the desk.');
		if (input.act === 'hand-over' && !may(ctx.actor, 'article.publish'))
			return refuse('forbidden', 'Only editors hand articles over.');
		const rows = await filing.lockBySlugs(tx, [...new Set(input.slugs)]);
		const [mine, others] = split(rows, (row) => may(ctx.actor, 'article.edit', { authorId: row.authorId }));
		const outcome =
			input.act === 'hand-over'
				? await handOver(ctx, tx, mine, input)
				: done(await file(ctx, tx, mine, input));
		if (!outcome.ok) return outcome;
		const gone = new Set(input.slugs).size - rows.length;
		return done({
			changed: outcome.value.changed,
			kept: [
				...outcome.value.kept,
				...why(others, 'is not yours to change'),
				...(gone > 0 ? [{ title: `${gone} chosen`, why: 'cannot be found any more' }] : [])
			]
		});
	});
