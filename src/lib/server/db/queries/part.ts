import { and, count, eq, inArray, or, sql } from 'drizzle-orm';
import type { PartKind } from '../../../domain/stores/words';
import type { Db } from '../client';
import { part, sample } from '../schema';
import { behind, containsWords, idsAmong, ordered, type Way, type Window } from '../search';

export interface PartFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	kind?: PartKind;
}

export type PartSort = 'id' | 'name' | 'kind' | 'newest';

const sorts = {
	id: [],
	name: [part.maker, part.model],
	kind: [part.kind, part.maker, part.model],
	newest: [part.createdAt]
} as const;

const matching = ({ q, kind, after }: PartFilter) =>
	and(
		behind(part.id, after),
		containsWords(q, [part.maker, part.model, part.slug]),
		kind === undefined ? undefined : eq(part.kind, kind)
	);

export const list = (db: Db, filter: PartFilter & { sort: PartSort; way: Way } & Window) =>
	db
		.select()
		.from(part)
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, part.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: PartFilter) =>
	(await db.select({ n: count() }).from(part).where(matching(filter)))[0]?.n ?? 0;

/** Parts by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select()
				.from(part)
				.where(or(inArray(part.slug, refs), ids.length ? inArray(part.id, ids) : undefined));
};

/** Samples there are of each part. */
export const sampleCounts = async (db: Db, partIds: number[]) =>
	partIds.length === 0
		? []
		: db
				.select({ partId: sample.partId, n: count() })
				.from(sample)
				.where(inArray(sample.partId, partIds))
				.groupBy(sample.partId);

/** Every part by name, for a list to choose from. */
export const names = (db: Db) =>
	db
		.select({ id: part.id, slug: part.slug, kind: part.kind, maker: part.maker, model: part.model })
		.from(part)
		.orderBy(part.maker, part.model);

export async function insert(db: Db, row: typeof part.$inferInsert): Promise<number> {
	const [created] = await db.insert(part).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the part.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof part.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(part)
		.set({ ...change, version: sql`${part.version} + 1` })
		.where(and(eq(part.id, id), eq(part.version, seen)));
	return result.affectedRows === 1;
}
