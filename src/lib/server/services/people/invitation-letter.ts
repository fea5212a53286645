import { DateTime } from 'luxon';
import { letter } from '../../../domain/mail/letter';
import type { Role } from '../../../domain/people/roles';
import { hashOf, newSecret } from '../../auth/secret';
import type { Db } from '../../db/client';
import * as settings from '../../db/queries/settings';
import { post } from '../../jobs/outbox';

const validDays = 7;

/** A fresh link for an invitation: what to store, and what to send. */
export function newInvitationLink(origin: string, now: Date) {
	const secret = newSecret();
	return {
		url: `${origin}/invite/${secret}`,
		tokenHash: hashOf(secret),
		expiresAt: new Date(now.getTime() + validDays * 86_400_000)
	};
}

export interface InvitationMail {
	email: string;
	name: string;
	roles: readonly Role[];
	inviter: string;
	link: ReturnType<typeof newInvitationLink>;
}

/** Posts an invitation in the caller's transaction. */
export async function postInvitation(tx: Db, now: Date, origin: string, mail: InvitationMail): Promise<void> {
	const { name: publication, zone } = await settings.publication(tx);
	const until = DateTime.fromJSDate(mail.link.expiresAt, { zone }).toFormat("d LLLL yyyy, HH:mm 'UTC'ZZ");
	const words = letter({
		subject: `${mail.inviter} invites you to ${publication}`,
		paragraphs: [
			`Hello ${mail.name},`,
			`${mail.inviter} invites you to work on ${publication} as ${mail.roles.join(', ')}.`,
			`Choose a name and a password to begin. The link works once, until ${until}.`
		],
		link: { label: 'Accept the invitation', href: mail.link.url },
		publication,
		because: 'If you do not know what this is about, do nothing: the link runs out by itself.'
	});
	const messageId = `invitation.${mail.link.tokenHash.slice(0, 32)}@${new URL(origin).hostname}`;
	await post(tx, now, [{ messageId, recipient: mail.email, ...words }]);
}
