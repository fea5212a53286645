import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { pageSize } from '../../../schemas/listing';
import type { AuditQuery } from '../../../schemas/people';
import type { Context } from '../../context';
import * as auditLog from '../../db/queries/audit-log';
import * as settings from '../../db/queries/settings';

/** The start of a day in a zone; nothing for no day. */
const startOf = (day: string, zone: string, daysOn = 0) =>
	day === '' ? undefined : DateTime.fromISO(day, { zone }).plus({ days: daysOn }).startOf('day').toJSDate();

async function pageOf({ db }: Context, { who, act, kind, id, from, until, before }: AuditQuery) {
	const { zone } = await settings.publication(db);
	const filter: auditLog.AuditFilter = {
		actor: who,
		act,
		subjectKind: kind,
		subjectId: id,
		from: startOf(from, zone),
		until: startOf(until, zone, 1),
		before
	};
	const [rows, people, kinds] = await Promise.all([
		auditLog.list(db, filter, pageSize + 1),
		auditLog.everybody(db),
		auditLog.subjectKinds(db)
	]);
	const entries = rows.slice(0, pageSize);
	return { entries, older: rows.length > pageSize ? entries.at(-1)?.id : undefined, people, kinds };
}

/** A page of the audit log, newest first, and what it can be filtered by. */
export async function listAudit(
	ctx: Context,
	query: AuditQuery
): Promise<Outcome<Awaited<ReturnType<typeof pageOf>>, 'forbidden'>> {
	if (!may(ctx.actor, 'audit.read')) return refuse('forbidden', 'Only an admin reads the audit log.');
	return done(await pageOf(ctx, query));
}
