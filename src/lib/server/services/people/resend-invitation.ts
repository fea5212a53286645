import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as invitations from '../../db/queries/invitations';
import { newInvitationLink, postInvitation } from './invitation-letter';

/** Sends a waiting invitation again with a new link and a new week; the link sent before stops working. */
export async function resendInvitation(
	ctx: Context,
	id: number
): Promise<Outcome<{ email: string }, 'forbidden' | 'not_found'>> {
	const { actor, now, origin } = ctx;
	if (!may(actor, 'people.manage')) return refuse('forbidden', 'Only an admin invites people.');
	return inTransaction(ctx.db, async (tx) => {
		const invitation = await invitations.lockWaiting(tx, id);
		if (!invitation) return refuse('not_found', 'This invitation was accepted or revoked meanwhile.');
		const { email, name, roles } = invitation;
		const link = newInvitationLink(origin, now);
		await invitations.update(tx, id, { tokenHash: link.tokenHash, expiresAt: link.expiresAt });
		await postInvitation(tx, now, origin, { email, name, roles, inviter: actor.name, link });
		await audit.append(tx, [
			{
				at: now,
				actorId: actor.id,
				act: 'invitation.resend',
				subjectKind: 'invitation',
				subjectId: id,
				after: { email }
			}
		]);
		return done({ email });
	});
}
