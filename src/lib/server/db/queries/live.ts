import { and, asc, eq, gt, inArray, max, or, sql } from 'drizzle-orm';
import type { Db } from '../client';
import { auditEvent, user } from '../schema';

const kind = 'campaign';

/** Newest entry of a campaign's history; 0 where there is none. */
export async function newestOf(db: Db, campaignId: number): Promise<number> {
	const [row] = await db
		.select({ newest: max(auditEvent.id) })
		.from(auditEvent)
		.where(and(eq(auditEvent.subjectKind, kind), eq(auditEvent.subjectId, String(campaignId))));
	return row?.newest ?? 0;
}

/** Most entries that one look takes in; the rest comes with the next. */
const most = 2000;

/** Ids of the entries of some campaigns after an id of each: a range of one index for each campaign. */
export async function idsAfter(
	db: Db,
	after: ReadonlyMap<number, number>
): Promise<{ id: number; subject: number }[]> {
	if (after.size === 0) return [];
	const rows = await db
		.select({ id: auditEvent.id, subject: auditEvent.subjectId })
		.from(auditEvent)
		.where(
			and(
				eq(auditEvent.subjectKind, kind),
				or(
					...[...after].map(([campaignId, id]) =>
						and(eq(auditEvent.subjectId, String(campaignId)), gt(auditEvent.id, id))
					)
				)
			)
		)
		.orderBy(asc(auditEvent.id))
		.limit(most);
	return rows.map((row) => ({ id: row.id, subject: Number(row.subject) }));
}

/** Entries as a board tells them: who did what in which cell, and with how many readings. */
export async function events(db: Db, ids: number[]) {
	if (ids.length === 0) return [];
	const rows = await db
		.select({
			id: auditEvent.id,
			subject: auditEvent.subjectId,
			act: auditEvent.act,
			actorId: auditEvent.actorId,
			who: user.name,
			cell: sql<
				string | null
			>`coalesce(json_value(${auditEvent.after}, '$.cell'), json_value(${auditEvent.before}, '$.cell'))`,
			readings: sql<number | null>`json_length(${auditEvent.after}, '$.readings')`.mapWith(Number)
		})
		.from(auditEvent)
		.leftJoin(user, eq(user.id, auditEvent.actorId))
		.where(inArray(auditEvent.id, ids))
		.orderBy(asc(auditEvent.id));
	return rows.map((row) => ({ ...row, subject: Number(row.subject), readings: row.readings ?? 0 }));
}
export type CampaignEvent = Awaited<ReturnType<typeof events>>[number];
