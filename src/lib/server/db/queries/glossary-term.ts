import { and, asc, count, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { glossaryTerm } from '../schema';
import { containsWords, type Window } from '../search';

export interface TermFilter {
	q: string;
	state: 'open' | 'retired' | 'all';
}

const states = {
	open: isNull(glossaryTerm.retiredAt),
	retired: isNotNull(glossaryTerm.retiredAt),
	all: undefined
};

const matching = ({ q, state }: TermFilter) =>
	and(
		containsWords(q, [glossaryTerm.term, glossaryTerm.slug, glossaryTerm.explanation, glossaryTerm.aliases]),
		states[state]
	);

export const list = (db: Db, filter: TermFilter & Window) =>
	db
		.select()
		.from(glossaryTerm)
		.where(matching(filter))
		.orderBy(asc(glossaryTerm.term), asc(glossaryTerm.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: TermFilter) =>
	(await db.select({ n: count() }).from(glossaryTerm).where(matching(filter)))[0]?.n ?? 0;

/** The terms that may be named, as articles take them. */
export const standing = (db: Db) =>
	db
		.select({
			slug: glossaryTerm.slug,
			term: glossaryTerm.term,
			explanation: glossaryTerm.explanation,
			aliases: glossaryTerm.aliases
		})
		.from(glossaryTerm)
		.where(isNull(glossaryTerm.retiredAt))
		.orderBy(asc(glossaryTerm.term), asc(glossaryTerm.id));

/** The words every term is called by, retired ones too. */
export const words = (db: Db) =>
	db
		.select({ id: glossaryTerm.id, term: glossaryTerm.term, aliases: glossaryTerm.aliases })
		.from(glossaryTerm)
		.for('update');

export const bySlug = async (db: Db, slug: string) =>
	(await db.select().from(glossaryTerm).where(eq(glossaryTerm.slug, slug)))[0];

export async function insert(db: Db, row: typeof glossaryTerm.$inferInsert): Promise<number> {
	const [created] = await db.insert(glossaryTerm).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the term.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof glossaryTerm.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(glossaryTerm)
		.set({ ...change, version: sql`${glossaryTerm.version} + 1` })
		.where(and(eq(glossaryTerm.id, id), eq(glossaryTerm.version, seen)));
	return result.affectedRows === 1;
}
