import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as sessions from '../../db/queries/sessions';

/** Ends all sessions of the person who asks, this one too. Tokens go on working. */
export async function signOutEverywhere(ctx: Context): Promise<Outcome<null, 'forbidden'>> {
	if (!may(ctx.actor, 'account.use')) return refuse('forbidden', 'A token cannot sign anybody out.');
	await inTransaction(ctx.db, async (tx) => {
		await sessions.endAll(tx, ctx.actor.id);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'person.sign-out-everywhere',
				subjectKind: 'person',
				subjectId: ctx.actor.id
			}
		]);
	});
	return done(null);
}
