import { and, desc, eq } from 'drizzle-orm';
import type { Db } from '../client';
import { auditEvent, user } from '../schema';

export interface AuditEntry {
	at: Date;
	actorId: string | null;
	act: string;
	subjectKind: string;
	subjectId: string | number;
	before?: unknown;
	after?: unknown;
	reason?: string | null;
}

/** Appends entries; nothing ever changes or removes one. */
export async function append(db: Db, entries: AuditEntry[]): Promise<void> {
	if (entries.length === 0) return;
	await db.insert(auditEvent).values(
		entries.map((entry) => ({
			...entry,
			subjectId: String(entry.subjectId),
			before: entry.before ?? null,
			after: entry.after ?? null
		}))
	);
}

/** What happened to one row, newest first, with the names of those who did it. */
export const ofSubject = (db: Db, subjectKind: string, subjectId: string | number, limit = 200) =>
	db
		.select({
			id: auditEvent.id,
			at: auditEvent.at,
			act: auditEvent.act,
			before: auditEvent.before,
			after: auditEvent.after,
			reason: auditEvent.reason,
			actorName: user.name
		})
		.from(auditEvent)
		.leftJoin(user, eq(user.id, auditEvent.actorId))
		.where(and(eq(auditEvent.subjectKind, subjectKind), eq(auditEvent.subjectId, String(subjectId))))
		.orderBy(desc(auditEvent.id))
		.limit(limit);
