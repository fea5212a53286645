import { and, asc, count, eq, inArray, isNotNull, isNull, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { campaign, campaignWorkload, instrument, workload } from '../schema';
import { behind, containsWords, idsAmong, ordered, type Way, type Window } from '../search';

export interface InstrumentFilter {
	q: string;
	/** Only rows with a greater id. */
	after?: number;
	state: 'open' | 'retired' | 'all';
}

export type InstrumentSort = 'id' | 'name' | 'due' | 'newest';

const sorts = {
	id: [],
	name: [instrument.name],
	// What has no date comes last.
	due: [sql`${instrument.calibrationDueOn} is null`, instrument.calibrationDueOn],
	newest: [instrument.createdAt]
};

const states = {
	open: isNull(instrument.retiredAt),
	retired: isNotNull(instrument.retiredAt),
	all: undefined
};

const matching = ({ q, state, after }: InstrumentFilter) =>
	and(
		behind(instrument.id, after),
		containsWords(q, [instrument.name, instrument.slug, instrument.serial, instrument.quantity]),
		states[state]
	);

export const list = (db: Db, filter: InstrumentFilter & { sort: InstrumentSort; way: Way } & Window) =>
	db
		.select()
		.from(instrument)
		.where(matching(filter))
		.orderBy(...ordered([...sorts[filter.sort]], filter.way, instrument.id))
		.limit(filter.limit)
		.offset(filter.offset);

export const total = async (db: Db, filter: InstrumentFilter) =>
	(await db.select({ n: count() }).from(instrument).where(matching(filter)))[0]?.n ?? 0;

/** Every instrument, retired ones too, by name. */
export const all = (db: Db) => db.select().from(instrument).orderBy(asc(instrument.name), asc(instrument.id));

/** Instruments by slug or id, in no order. */
export const byRefs = async (db: Db, refs: string[]) => {
	const ids = idsAmong(refs);
	return refs.length === 0
		? []
		: db
				.select()
				.from(instrument)
				.where(or(inArray(instrument.slug, refs), ids.length ? inArray(instrument.id, ids) : undefined));
};

/** The columns of campaigns that each instrument is named for. */
export const usesOf = async (db: Db, instrumentIds: number[]) =>
	instrumentIds.length === 0
		? []
		: db
				.select({
					instrumentId: campaignWorkload.instrumentId,
					campaign: campaign.slug,
					name: campaign.name,
					workload: workload.name
				})
				.from(campaignWorkload)
				.innerJoin(campaign, eq(campaign.id, campaignWorkload.campaignId))
				.innerJoin(workload, eq(workload.id, campaignWorkload.workloadId))
				.where(inArray(campaignWorkload.instrumentId, instrumentIds))
				.orderBy(asc(campaign.name), asc(workload.name));

/** The instrument of each column of a campaign that has one. */
export const ofCampaign = (db: Db, campaignId: number) =>
	db
		.select({
			workloadId: campaignWorkload.workloadId,
			slug: instrument.slug,
			name: instrument.name,
			calibratedOn: instrument.calibratedOn,
			calibrationDueOn: instrument.calibrationDueOn,
			retiredAt: instrument.retiredAt
		})
		.from(campaignWorkload)
		.innerJoin(instrument, eq(instrument.id, campaignWorkload.instrumentId))
		.where(eq(campaignWorkload.campaignId, campaignId));

/** Names the instrument of a column; null for none. */
export const setForColumn = (db: Db, campaignId: number, workloadId: number, instrumentId: number | null) =>
	db
		.update(campaignWorkload)
		.set({ instrumentId })
		.where(and(eq(campaignWorkload.campaignId, campaignId), eq(campaignWorkload.workloadId, workloadId)));

export async function insert(db: Db, row: typeof instrument.$inferInsert): Promise<number> {
	const [created] = await db.insert(instrument).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the instrument.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	seen: number,
	change: Partial<typeof instrument.$inferInsert>
): Promise<boolean> {
	const [result] = await db
		.update(instrument)
		.set({ ...change, version: sql`${instrument.version} + 1` })
		.where(and(eq(instrument.id, id), eq(instrument.version, seen)));
	return result.affectedRows === 1;
}
