import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as invitations from '../../db/queries/invitations';

/** Takes a waiting invitation back: its link stops working. */
export async function revokeInvitation(
	ctx: Context,
	id: number
): Promise<Outcome<{ email: string }, 'forbidden' | 'not_found'>> {
	const { actor, now } = ctx;
	if (!may(actor, 'people.manage')) return refuse('forbidden', 'Only an admin takes invitations back.');
	return inTransaction(ctx.db, async (tx) => {
		const invitation = await invitations.lockWaiting(tx, id);
		if (!invitation) return refuse('not_found', 'This invitation was accepted or revoked meanwhile.');
		await invitations.update(tx, id, { revokedAt: now });
		await audit.append(tx, [
			{
				at: now,
				actorId: actor.id,
				act: 'invitation.revoke',
				subjectKind: 'invitation',
				subjectId: id,
				before: { email: invitation.email }
			}
		]);
		return done({ email: invitation.email });
	});
}
