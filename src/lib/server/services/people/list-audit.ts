import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as auditLog from '../../db/queries/audit-log';

const entriesPerPage = 50;

async function pageOf({ db }: Context, filter: auditLog.AuditFilter) {
	const [rows, people, kinds] = await Promise.all([
		auditLog.list(db, filter, entriesPerPage + 1),
		auditLog.everybody(db),
		auditLog.subjectKinds(db)
	]);
	const entries = rows.slice(0, entriesPerPage);
	return { entries, older: rows.length > entriesPerPage ? entries.at(-1)?.id : undefined, people, kinds };
}

/** A page of the audit log, newest first, and what it can be filtered by. */
export async function listAudit(
	ctx: Context,
	filter: auditLog.AuditFilter
): Promise<Outcome<Awaited<ReturnType<typeof pageOf>>, 'forbidden'>> {
	if (!may(ctx.actor, 'audit.read')) return refuse('forbidden', 'Only an admin reads the audit log.');
	return done(await pageOf(ctx, filter));
}
