import { and, asc, desc, eq, inArray, isNotNull, lte, type SQL } from 'drizzle-orm';
import { owedStages } from '../../../domain/stores/loan';
import type { LoanStage } from '../../../domain/stores/words';
import type { Db } from '../client';
import { loan, loanReminder, loanSample, part, partner, sample } from '../schema';

export interface LoanFilter {
	partnerId?: number;
	stages?: LoanStage[];
	limit: number;
	offset: number;
}

const matching = ({ partnerId, stages }: Pick<LoanFilter, 'partnerId' | 'stages'>): SQL | undefined =>
	and(
		partnerId === undefined ? undefined : eq(loan.partnerId, partnerId),
		stages?.length ? inArray(loan.stage, stages) : undefined
	);

/** Loans with their partner, the soonest due first. */
export const list = (db: Db, filter: LoanFilter) =>
	db
		.select({
			id: loan.id,
			stage: loan.stage,
			askedOn: loan.askedOn,
			receivedOn: loan.receivedOn,
			dueOn: loan.dueOn,
			closedOn: loan.closedOn,
			partnerName: partner.name,
			partnerSlug: partner.slug
		})
		.from(loan)
		.innerJoin(partner, eq(partner.id, loan.partnerId))
		.where(matching(filter))
		.orderBy(asc(loan.dueOn), desc(loan.id))
		.limit(filter.limit)
		.offset(filter.offset);

/** The samples of several loans, named. */
export const samplesOf = (db: Db, loanIds: number[]) =>
	loanIds.length === 0
		? Promise.resolve([])
		: db
				.select({
					loanId: loanSample.loanId,
					sampleId: sample.id,
					slug: sample.slug,
					serial: sample.serial,
					condition: sample.condition,
					place: sample.place,
					maker: part.maker,
					model: part.model,
					partSlug: part.slug
				})
				.from(loanSample)
				.innerJoin(sample, eq(sample.id, loanSample.sampleId))
				.innerJoin(part, eq(part.id, sample.partId))
				.where(inArray(loanSample.loanId, loanIds))
				.orderBy(asc(part.maker), asc(part.model));

export const byId = async (db: Db, id: number) =>
	(
		await db
			.select({
				loan,
				partnerName: partner.name,
				partnerSlug: partner.slug,
				contactName: partner.contactName,
				contactEmail: partner.contactEmail
			})
			.from(loan)
			.innerJoin(partner, eq(partner.id, loan.partnerId))
			.where(eq(loan.id, id))
			.limit(1)
	)[0];

/** The loan row, locked until the transaction ends. */
export const lock = async (db: Db, id: number) =>
	(await db.select().from(loan).where(eq(loan.id, id)).for('update'))[0];

export async function insert(db: Db, row: typeof loan.$inferInsert, sampleIds: number[]): Promise<number> {
	const [created] = await db.insert(loan).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the loan.');
	await db.insert(loanSample).values(sampleIds.map((sampleId) => ({ loanId: created.id, sampleId })));
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	version: number,
	change: Partial<typeof loan.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(loan)
		.set({ ...change, version: version + 1 })
		.where(and(eq(loan.id, id), eq(loan.version, version)));
	return result.affectedRows === 1;
}

/** Loans in our hands whose due date is on or before a date: those that may call for a reminder. */
export const dueBy = (db: Db, date: string) =>
	db
		.select({ id: loan.id, stage: loan.stage, dueOn: loan.dueOn, partnerName: partner.name })
		.from(loan)
		.innerJoin(partner, eq(partner.id, loan.partnerId))
		.where(and(inArray(loan.stage, [...owedStages]), isNotNull(loan.dueOn), lte(loan.dueOn, date)))
		.orderBy(asc(loan.dueOn));

/** Marks reminders as given; of those asked for, returns only the ones that were not given before. */
export async function claimReminders(
	db: Db,
	wanted: { loanId: number; kind: string; dueOn: string; sentAt: Date }[]
) {
	if (wanted.length === 0) return [];
	const given = await db
		.select({ loanId: loanReminder.loanId, kind: loanReminder.kind, dueOn: loanReminder.dueOn })
		.from(loanReminder)
		.where(
			inArray(
				loanReminder.loanId,
				wanted.map((w) => w.loanId)
			)
		)
		.for('update');
	const seen = new Set(given.map((g) => `${g.loanId}/${g.kind}/${g.dueOn}`));
	const fresh = wanted.filter((w) => !seen.has(`${w.loanId}/${w.kind}/${w.dueOn}`));
	if (fresh.length > 0) await db.insert(loanReminder).values(fresh);
	return fresh;
}
