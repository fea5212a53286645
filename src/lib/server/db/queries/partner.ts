import { and, asc, count, eq, inArray, like, lt, or, sql, type SQL } from 'drizzle-orm';
import { owedStages } from '../../../domain/stores/loan';
import type { Db } from '../client';
import { loan, partner } from '../schema';

export interface PartnerFilter {
	text: string;
	/** ISO date of today, to count what is overdue. */
	today: string;
	limit: number;
	offset: number;
}

const matching = (text: string): SQL | undefined =>
	text ? or(like(partner.name, `%${text}%`), like(partner.contactName, `%${text}%`)) : undefined;
const owed = sql`sum(case when ${inArray(loan.stage, [...owedStages])} then 1 else 0 end)`;

/** Partners by name, with how many loans are open and how many of them overdue. */
export const list = (db: Db, { text, today, limit, offset }: PartnerFilter) =>
	db
		.select({
			id: partner.id,
			slug: partner.slug,
			name: partner.name,
			contactName: partner.contactName,
			contactEmail: partner.contactEmail,
			loans: count(loan.id),
			owed: sql<number>`coalesce(${owed}, 0)`.mapWith(Number),
			overdue:
				sql<number>`coalesce(sum(case when ${and(inArray(loan.stage, [...owedStages]), lt(loan.dueOn, today))} then 1 else 0 end), 0)`.mapWith(
					Number
				)
		})
		.from(partner)
		.leftJoin(loan, eq(loan.partnerId, partner.id))
		.where(matching(text))
		.groupBy(partner.id)
		.orderBy(asc(partner.name))
		.limit(limit)
		.offset(offset);

export const countMatching = async (db: Db, text: string): Promise<number> =>
	(await db.select({ n: count() }).from(partner).where(matching(text)))[0]?.n ?? 0;

export const bySlug = async (db: Db, slug: string) =>
	(await db.select().from(partner).where(eq(partner.slug, slug)).limit(1))[0];

export async function insert(db: Db, row: typeof partner.$inferInsert): Promise<number> {
	const [created] = await db.insert(partner).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the partner.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	version: number,
	change: Partial<typeof partner.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(partner)
		.set({ ...change, version: version + 1 })
		.where(and(eq(partner.id, id), eq(partner.version, version)));
	return result.affectedRows === 1;
}
