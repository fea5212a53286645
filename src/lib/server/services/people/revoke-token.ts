import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as apiTokens from '../../db/queries/api-tokens';
import * as audit from '../../db/queries/audit';

/** Ends one of one's own tokens. */
export async function revokeToken(
	ctx: Context,
	id: number
): Promise<Outcome<null, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'account.use')) return refuse('forbidden', 'A token cannot revoke tokens.');
	return inTransaction(ctx.db, async (tx) => {
		if (!(await apiTokens.revoke(tx, ctx.actor.id, id, ctx.now))) {
			return refuse('not_found', 'There is no such token, or it was revoked before.');
		}
		await audit.append(tx, [
			{ at: ctx.now, actorId: ctx.actor.id, act: 'token.revoke', subjectKind: 'token', subjectId: id }
		]);
		return done(null);
	});
}
