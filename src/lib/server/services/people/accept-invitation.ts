import { randomUUID } from 'node:crypto';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { AcceptInput } from '../../../schemas/people';
import { hashPassword } from '../../auth/password';
import { hashOf } from '../../auth/secret';
import type { OpenContext } from '../../context';
import { inTransaction, isDuplicate, type Transaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as invitations from '../../db/queries/invitations';
import * as people from '../../db/queries/people';

type Invitation = NonNullable<Awaited<ReturnType<typeof invitations.byHash>>>;

const askAgain = 'Ask whoever invited you to send it again.';

function usable(invitation: Invitation | null, now: Date): Outcome<Invitation, 'gone'> {
	if (!invitation)
		return refuse('gone', `This invitation is not known, or a newer one replaced it. ${askAgain}`);
	if (invitation.acceptedAt)
		return refuse('gone', 'This invitation was used already. Sign in with the address it was sent to.');
	if (invitation.revokedAt) return refuse('gone', `This invitation was taken back. ${askAgain}`);
	if (invitation.expiresAt <= now) return refuse('gone', `This invitation has run out. ${askAgain}`);
	return done(invitation);
}

/** Whom an invitation's link is for, without using it. */
export async function readInvitation(
	ctx: OpenContext,
	secret: string
): Promise<Outcome<Pick<Invitation, 'email' | 'name' | 'roles'>, 'gone'>> {
	const found = usable(await invitations.byHash(ctx.db, hashOf(secret)), ctx.now);
	if (!found.ok) return found;
	const { email, name, roles } = found.value;
	return done({ email, name, roles });
}

async function addPerson(
	tx: Transaction,
	now: Date,
	{ id, email, roles }: Invitation,
	name: string,
	passwordHash: string
) {
	const userId = randomUUID();
	await people.insert(
		tx,
		{ id: userId, name, email, passwordHash, emailVerified: now, createdAt: now },
		roles
	);
	await invitations.update(tx, id, { acceptedAt: now });
	await audit.append(tx, [
		{
			at: now,
			actorId: userId,
			act: 'invitation.accept',
			subjectKind: 'person',
			subjectId: userId,
			after: { name, email, roles }
		}
	]);
	return done({ userId });
}

/** Makes a person of an invitation, once. */
export async function acceptInvitation(
	ctx: OpenContext,
	secret: string,
	{ name, password }: AcceptInput
): Promise<Outcome<{ userId: string }, 'gone' | 'conflict'>> {
	const known = usable(await invitations.byHash(ctx.db, hashOf(secret)), ctx.now);
	if (!known.ok) return known;
	const passwordHash = await hashPassword(password);
	try {
		return await inTransaction(ctx.db, async (tx) => {
			const locked = await invitations.lockWaiting(tx, known.value.id);
			const still = usable(locked?.tokenHash === hashOf(secret) ? locked : null, ctx.now);
			return still.ok ? addPerson(tx, ctx.now, still.value, name, passwordHash) : still;
		});
	} catch (error) {
		if (!isDuplicate(error)) throw error;
		return refuse('conflict', 'Somebody with this address is here already. Sign in, or have a link sent.');
	}
}
