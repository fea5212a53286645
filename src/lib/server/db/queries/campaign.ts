import {
	and,
	asc,
	count,
	desc,
	eq,
	exists,
	gt,
	isNotNull,
	isNull,
	like,
	not,
	or,
	sql,
	type SQL
} from 'drizzle-orm';
import type { CampaignState } from '../../../domain/bench/campaign-state';
import type { Db } from '../client';
import { campaign, campaignProfile, campaignWorkload, cellSignature, rig, rigRevision, run } from '../schema';

export interface CampaignFilter {
	/** Words in the name, the slug or the rig's name. */
	text: string;
	rig: string;
	state: CampaignState | 'open' | 'all';
	sort: 'created' | 'due' | 'name' | 'id';
	way: 'up' | 'down';
	/** Only rows after this id. */
	after?: number;
	limit: number;
	offset: number;
}

const escaped = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

/** Every cell bears a standing signature; false for a campaign without cells. */
const allSigned = (db: Db): SQL => {
	const signed = db
		.select({ n: count() })
		.from(cellSignature)
		.where(and(eq(cellSignature.campaignId, campaign.id), isNull(cellSignature.removedAt)));
	const profiles = db
		.select({ n: count() })
		.from(campaignProfile)
		.where(eq(campaignProfile.campaignId, campaign.id));
	const workloads = db
		.select({ n: count() })
		.from(campaignWorkload)
		.where(eq(campaignWorkload.campaignId, campaign.id));
	return sql`(${signed}) > 0 and (${signed}) = (${profiles}) * (${workloads})`;
};

function inState(db: Db, state: CampaignFilter['state']): SQL | undefined {
	const started = exists(
		db
			.select({ one: sql`1` })
			.from(run)
			.where(and(eq(run.campaignId, campaign.id), isNull(run.voidedAt)))
	);
	const open = isNull(campaign.archivedAt);
	if (state === 'archived') return isNotNull(campaign.archivedAt);
	if (state === 'planned') return and(open, not(started));
	if (state === 'running') return and(open, started, sql`not (${allSigned(db)})`);
	if (state === 'signed') return and(open, allSigned(db));
	return state === 'open' ? open : undefined;
}

const matching = (
	db: Db,
	filter: Pick<CampaignFilter, 'text' | 'rig' | 'state' | 'after'>
): SQL | undefined =>
	and(
		filter.text === ''
			? undefined
			: or(
					like(campaign.name, escaped(filter.text)),
					like(campaign.slug, escaped(filter.text)),
					like(rig.name, escaped(filter.text))
				),
		filter.rig === '' ? undefined : eq(rig.slug, filter.rig),
		inState(db, filter.state),
		filter.after === undefined ? undefined : gt(campaign.id, filter.after)
	);

function order({ sort, way }: CampaignFilter): SQL[] {
	const turned = way === 'up' ? asc : desc;
	if (sort === 'id') return [turned(campaign.id)];
	if (sort === 'name') return [turned(campaign.name), asc(campaign.id)];
	// What has no due date comes last, whichever way.
	if (sort === 'due') return [asc(sql`${campaign.dueAt} is null`), turned(campaign.dueAt), desc(campaign.id)];
	return [turned(campaign.createdAt), turned(campaign.id)];
}

/** One page of campaigns with their rigs. */
export const list = (db: Db, filter: CampaignFilter) =>
	db
		.select({
			id: campaign.id,
			slug: campaign.slug,
			name: campaign.name,
			purpose: campaign.purpose,
			dueAt: campaign.dueAt,
			createdAt: campaign.createdAt,
			archivedAt: campaign.archivedAt,
			version: campaign.version,
			rigSlug: rig.slug,
			rigName: rig.name,
			rigRevision: rigRevision.number
		})
		.from(campaign)
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.where(matching(db, filter))
		.orderBy(...order(filter))
		.limit(filter.limit)
		.offset(filter.offset);

export async function total(db: Db, filter: CampaignFilter): Promise<number> {
	const [row] = await db
		.select({ n: count() })
		.from(campaign)
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.where(matching(db, filter));
	return row?.n ?? 0;
}

/** Rigs that have campaigns, for the list's filter. */
export const rigsUsed = (db: Db) =>
	db
		.selectDistinct({ slug: rig.slug, name: rig.name })
		.from(campaign)
		.innerJoin(rigRevision, eq(rigRevision.id, campaign.rigRevisionId))
		.innerJoin(rig, eq(rig.id, rigRevision.rigId))
		.orderBy(asc(rig.name));

/** The id behind a slug or an id; undefined where there is no such campaign. */
export async function idOf(db: Db, ref: string): Promise<number | undefined> {
	const byId = /^\d{1,9}$/.test(ref) ? eq(campaign.id, Number(ref)) : eq(campaign.slug, ref);
	const [row] = await db.select({ id: campaign.id }).from(campaign).where(byId).limit(1);
	return row?.id;
}

/** The campaign row, locked until the transaction ends, for a change of the plan. */
export const lock = async (db: Db, id: number) =>
	(await db.select().from(campaign).where(eq(campaign.id, id)).for('update'))[0];

export async function insert(db: Db, row: typeof campaign.$inferInsert): Promise<number> {
	const [created] = await db.insert(campaign).values(row).$returningId();
	if (!created) throw new Error('The database gave no id for the campaign.');
	return created.id;
}

/** Writes an edit over the version it saw; false when somebody else was faster. */
export async function update(
	db: Db,
	id: number,
	version: number,
	change: Partial<Pick<typeof campaign.$inferInsert, 'name' | 'purpose' | 'dueAt' | 'archivedAt'>>
): Promise<boolean> {
	const [result] = await db
		.update(campaign)
		.set({ ...change, version: version + 1 })
		.where(and(eq(campaign.id, id), eq(campaign.version, version)));
	return result.affectedRows === 1;
}
