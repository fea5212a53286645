import { asc, eq } from 'drizzle-orm';
import type { Db } from '../client';
import { embargo, part, sample } from '../schema';

/** Embargoes that came with a loan, with the sample each is on. */
export const ofLoan = (db: Db, loanId: number) =>
	db
		.select({
			id: embargo.id,
			field: embargo.field,
			until: embargo.until,
			note: embargo.note,
			liftedAt: embargo.liftedAt,
			liftReason: embargo.liftReason,
			sampleId: embargo.sampleId,
			sampleSlug: sample.slug,
			maker: part.maker,
			model: part.model
		})
		.from(embargo)
		.innerJoin(sample, eq(sample.id, embargo.sampleId))
		.innerJoin(part, eq(part.id, sample.partId))
		.where(eq(embargo.loanId, loanId))
		.orderBy(asc(embargo.until));

export const lock = async (db: Db, id: number) =>
	(await db.select().from(embargo).where(eq(embargo.id, id)).for('update'))[0];

export async function insert(db: Db, row: typeof embargo.$inferInsert): Promise<number> {
	const [created] = await db.insert(embargo).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the embargo.');
	return created.id;
}

export const lift = (db: Db, id: number, change: { liftedAt: Date; liftedBy: string; liftReason: string }) =>
	db.update(embargo).set(change).where(eq(embargo.id, id));
