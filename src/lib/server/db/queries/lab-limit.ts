import { and, asc, eq, sql } from 'drizzle-orm';
import type { SettingQuantity } from '../../../domain/bench/words';
import type { PartKind } from '../../../domain/stores/words';
import type { Db } from '../client';
import { labLimit, user } from '../schema';
import { behind, containsWords } from '../search';

export interface LimitFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	quantity?: SettingQuantity;
	partKind?: PartKind;
	limit: number;
}

const columns = {
	id: labLimit.id,
	quantity: labLimit.quantity,
	partKind: labLimit.partKind,
	limit: labLimit.limit,
	unit: labLimit.unit,
	source: labLimit.source,
	createdBy: user.name,
	createdAt: labLimit.createdAt,
	version: labLimit.version
};

/** Every limit of the lab with who wrote it, by quantity and kind of part. */
export const list = (db: Db) =>
	db
		.select(columns)
		.from(labLimit)
		.innerJoin(user, eq(user.id, labLimit.createdBy))
		.orderBy(asc(labLimit.quantity), asc(labLimit.partKind));

/** Some of the limits in the order they were written, behind a cursor. */
export const page = (db: Db, { q, after, quantity, partKind, limit }: LimitFilter) =>
	db
		.select(columns)
		.from(labLimit)
		.innerJoin(user, eq(user.id, labLimit.createdBy))
		.where(
			and(
				behind(labLimit.id, after),
				containsWords(q, [labLimit.source, labLimit.unit]),
				quantity && eq(labLimit.quantity, quantity),
				partKind && eq(labLimit.partKind, partKind)
			)
		)
		.orderBy(asc(labLimit.id))
		.limit(limit);

/** One limit with who wrote it. */
export const whole = async (db: Db, id: number) =>
	(
		await db
			.select(columns)
			.from(labLimit)
			.innerJoin(user, eq(user.id, labLimit.createdBy))
			.where(eq(labLimit.id, id))
	)[0];

export const byId = async (db: Db, id: number) =>
	(await db.select().from(labLimit).where(eq(labLimit.id, id)))[0];

export async function insert(db: Db, row: typeof labLimit.$inferInsert): Promise<number> {
	const [created] = await db.insert(labLimit).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the limit.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof labLimit.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(labLimit)
		.set({ ...change, version: sql`${labLimit.version} + 1` })
		.where(and(eq(labLimit.id, id), eq(labLimit.version, seen)));
	return result.affectedRows === 1;
}

/** Takes a line out over the version that was seen; what it said stays in the audit log. */
export async function remove(db: Db, id: number, seen: number): Promise<boolean> {
	const [result] = await db.delete(labLimit).where(and(eq(labLimit.id, id), eq(labLimit.version, seen)));
	return result.affectedRows === 1;
}
