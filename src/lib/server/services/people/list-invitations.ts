import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as invitations from '../../db/queries/invitations';

type Waiting = Awaited<ReturnType<typeof invitations.listWaiting>>[number] & { hasRunOut: boolean };

/** Invitations that nobody has answered yet. */
export async function listInvitations(ctx: Context): Promise<Outcome<Waiting[], 'forbidden'>> {
	if (!may(ctx.actor, 'people.manage')) return refuse('forbidden', 'Only an admin sees invitations.');
	const rows = await invitations.listWaiting(ctx.db);
	return done(rows.map((row) => ({ ...row, hasRunOut: row.expiresAt <= ctx.now })));
}
