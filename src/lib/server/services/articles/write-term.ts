import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome, type Refusal } from '../../../domain/shared/outcome';
import { changedMeanwhile, slugMissing, slugTaken } from '../../../domain/shared/refusals';
import { isReserved, slugOf } from '../../../domain/shared/slug';
import type { TermEdit, TermInput, TermRetire } from '../../../schemas/glossary';
import type { Context } from '../../context';
import { inTransaction, isDuplicate, type Transaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as terms from '../../db/queries/glossary-term';

type Row = NonNullable<Awaited<ReturnType<typeof terms.bySlug>>>;
type Change = Partial<Pick<Row, 'term' | 'explanation' | 'aliases' | 'retiredAt'>>;
type Written = Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>;

const onlyWriters = () => refuse('forbidden', 'Only writers and editors change the glossary.');
const folded = (word: string) => word.trim().toLowerCase();

/** A word that another term is called by already; null where there is none. */
async function wordTaken(
	tx: Transaction,
	own: Pick<Row, 'term' | 'aliases'>,
	id: number | null
): Promise<Refusal<'conflict'> | null> {
	const others = (await terms.words(tx)).filter((one) => one.id !== id);
	const taken = new Map(
		others.flatMap(({ term, aliases }) => [term, ...aliases].map((word) => [folded(word), term]))
	);
	for (const [field, words] of [
		['term', [own.term]],
		['aliases', own.aliases]
	] as const) {
		const word = words.find((one) => taken.has(folded(one)));
		if (word !== undefined) {
			const message = `“${word}” is a word of the term “${taken.get(folded(word)) ?? ''}” already.`;
			return refuse('conflict', `Nothing was saved: ${message}`, { fields: { [field]: [message] } });
		}
	}
	return null;
}

/** Adds a word to the glossary. */
export async function createTerm(ctx: Context, input: TermInput): Promise<Written> {
	if (!may(ctx.actor, 'glossary.edit')) return onlyWriters();
	const slug = input.slug || slugOf(input.term);
	if (slug === '' || isReserved(slug)) return slugMissing();
	const own = { slug, term: input.term, explanation: input.explanation, aliases: input.aliases };
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const taken = await wordTaken(tx, own, null);
			if (taken) return taken;
			const who = {
				createdBy: ctx.actor.id,
				createdAt: ctx.now,
				updatedBy: ctx.actor.id,
				updatedAt: ctx.now
			};
			const id = await terms.insert(tx, { ...own, ...who });
			await audit.append(tx, [
				{
					at: ctx.now,
					actorId: ctx.actor.id,
					act: 'term.create',
					subjectKind: 'term',
					subjectId: id,
					after: own
				}
			]);
			return done({ slug });
		});
	} catch (error) {
		if (isDuplicate(error)) return slugTaken('term', slug);
		throw error;
	}
}

async function write(
	ctx: Context,
	slug: string,
	version: number,
	decide: (row: Row) => { act: string; change: Change }
): Promise<Written> {
	if (!may(ctx.actor, 'glossary.edit')) return onlyWriters();
	return inTransaction(ctx.db, async (tx) => {
		const before = await terms.bySlug(tx, slug);
		if (!before) return refuse('not_found', `There is no term “${slug}” in the glossary.`);
		const { act, change } = decide(before);
		const taken = await wordTaken(tx, { ...before, ...change }, before.id);
		if (taken) return taken;
		const row = { ...change, updatedBy: ctx.actor.id, updatedAt: ctx.now };
		if (!(await terms.update(tx, before.id, version, row))) return changedMeanwhile('term', before.version);
		const was = Object.fromEntries(Object.keys(change).map((key) => [key, before[key as keyof Change]]));
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act,
				subjectKind: 'term',
				subjectId: before.id,
				before: was,
				after: change
			}
		]);
		return done({ slug });
	});
}

/** Changes a term over the version that was seen. Editions keep the explanation they were printed with. */
export const editTerm = (ctx: Context, slug: string, { version, ...change }: TermEdit) =>
	write(ctx, slug, version, () => ({ act: 'term.edit', change }));

/** Takes a term out of the glossary, or back into it: articles can no longer name it, editions go on printing it. */
export const retireTerm = (ctx: Context, slug: string, { version, retired }: TermRetire) =>
	write(ctx, slug, version, ({ retiredAt }) => ({
		act: 'term.retire',
		change: { retiredAt: retired === 'yes' ? (retiredAt ?? ctx.now) : null }
	}));
