import { and, asc, desc, eq, gte, isNull, like, lt, type SQL } from 'drizzle-orm';
import type { Db } from '../client';
import { auditEvent, user } from '../schema';

export interface AuditFilter {
	/** A person's id, or 'application' for what nobody did by hand. */
	actor?: string;
	/** The first part of an act, such as `person`, or a whole one. */
	act?: string;
	subjectKind?: string;
	subjectId?: string;
	from?: Date;
	until?: Date;
	/** Only entries older than this one: the next page. */
	before?: number;
}

const likeStart = (text: string) => `${text.replace(/[\\%_]/g, '\\$&')}%`;

function matching({ actor, act, subjectKind, subjectId, from, until, before }: AuditFilter): SQL | undefined {
	return and(
		actor === 'application' ? isNull(auditEvent.actorId) : actor ? eq(auditEvent.actorId, actor) : undefined,
		act ? like(auditEvent.act, likeStart(act)) : undefined,
		subjectKind ? eq(auditEvent.subjectKind, subjectKind) : undefined,
		subjectId ? eq(auditEvent.subjectId, subjectId) : undefined,
		from ? gte(auditEvent.at, from) : undefined,
		until ? lt(auditEvent.at, until) : undefined,
		before ? lt(auditEvent.id, before) : undefined
	);
}

/** Entries of the audit log, newest first. */
export const list = (db: Db, filter: AuditFilter, limit: number) =>
	db
		.select({
			id: auditEvent.id,
			at: auditEvent.at,
			act: auditEvent.act,
			subjectKind: auditEvent.subjectKind,
			subjectId: auditEvent.subjectId,
			before: auditEvent.before,
			after: auditEvent.after,
			reason: auditEvent.reason,
			actorId: auditEvent.actorId,
			actorName: user.name
		})
		.from(auditEvent)
		.leftJoin(user, eq(user.id, auditEvent.actorId))
		.where(matching(filter))
		.orderBy(desc(auditEvent.id))
		.limit(limit);

/** Everybody who can stand in the log, for its filter. */
export const everybody = (db: Db) =>
	db.select({ id: user.id, name: user.name }).from(user).orderBy(asc(user.name)).limit(500);

/** The kinds of rows the log speaks of. */
export const subjectKinds = async (db: Db): Promise<string[]> =>
	(
		await db
			.selectDistinct({ kind: auditEvent.subjectKind })
			.from(auditEvent)
			.orderBy(asc(auditEvent.subjectKind))
	).map((row) => row.kind);
