import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { InviteInput } from '../../../schemas/people';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as invitations from '../../db/queries/invitations';
import * as people from '../../db/queries/people';
import { newInvitationLink, postInvitation } from './invitation-letter';

const taken = (message: string) =>
	refuse('invalid', 'No invitation was sent.', { fields: { email: [message] } });

/** Invites somebody by e-mail to set up their own entry, with the roles chosen for them. */
export async function invitePerson(
	ctx: Context,
	{ name, email, roles }: InviteInput
): Promise<Outcome<{ id: number }, 'forbidden' | 'invalid'>> {
	const { actor, now, origin } = ctx;
	if (!may(actor, 'people.manage')) return refuse('forbidden', 'Only an admin invites people.');
	return inTransaction(ctx.db, async (tx) => {
		if (await people.signInFacts(tx, email)) return taken('Somebody with this address is here already.');
		if (await invitations.waitingFor(tx, email))
			return taken('An invitation to this address is waiting. Send that one again, or revoke it.');
		const link = newInvitationLink(origin, now);
		const { tokenHash, expiresAt } = link;
		const row = { name, email, roles, tokenHash, invitedBy: actor.id, createdAt: now, expiresAt };
		const id = await invitations.insert(tx, row);
		await postInvitation(tx, now, origin, { email, name, roles, inviter: actor.name, link });
		await audit.append(tx, [
			{
				at: now,
				actorId: actor.id,
				act: 'invitation.send',
				subjectKind: 'invitation',
				subjectId: id,
				after: { name, email, roles }
			}
		]);
		return done({ id });
	});
}
