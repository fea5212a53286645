import { and, count, desc, eq, sql, type SQL } from 'drizzle-orm';
import type { Db } from '../client';
import { auditEvent, user } from '../schema';

/** Entries of one campaign, or of one of its cells. */
function matching(campaignId: number, cell: string): SQL | undefined {
	return and(
		eq(auditEvent.subjectKind, 'campaign'),
		eq(auditEvent.subjectId, String(campaignId)),
		cell === ''
			? undefined
			: sql`${cell} in (json_value(${auditEvent.after}, '$.cell'), json_value(${auditEvent.before}, '$.cell'))`
	);
}

/** One page of what happened in a campaign, newest first, with the names of those who did it. */
export const list = (
	db: Db,
	campaignId: number,
	{ cell, limit, offset }: { cell: string; limit: number; offset: number }
) =>
	db
		.select({
			id: auditEvent.id,
			at: auditEvent.at,
			act: auditEvent.act,
			before: auditEvent.before,
			after: auditEvent.after,
			reason: auditEvent.reason,
			who: user.name
		})
		.from(auditEvent)
		.leftJoin(user, eq(user.id, auditEvent.actorId))
		.where(matching(campaignId, cell))
		.orderBy(desc(auditEvent.id))
		.limit(limit)
		.offset(offset);

export async function total(db: Db, campaignId: number, cell: string): Promise<number> {
	const [row] = await db.select({ n: count() }).from(auditEvent).where(matching(campaignId, cell));
	return row?.n ?? 0;
}
