import { hashOf, newSecret } from '../../auth/secret';
import type { Db } from '../../db/client';
import * as sessions from '../../db/queries/sessions';

const identifierOf = (userId: string) => `password:${userId}`;

/** Makes a single-use link with which a person sets a password; links made before stop working. Needs a transaction. */
export async function makePasswordLink(tx: Db, origin: string, userId: string, expires: Date) {
	const secret = newSecret();
	await sessions.dropVerificationTokens(tx, identifierOf(userId));
	await sessions.addVerificationToken(tx, {
		identifier: identifierOf(userId),
		token: hashOf(secret),
		expires
	});
	return { url: `${origin}/password/${userId}.${secret}`, hash: hashOf(secret) };
}

/** The parts of a link's last segment; null when it cannot be one. */
export function splitPasswordLink(link: string) {
	const [, userId, secret] = /^([\w-]{1,36})\.([\w-]{40,64})$/.exec(link) ?? [];
	if (!userId || !secret) return null;
	return { userId, identifier: identifierOf(userId), token: hashOf(secret) };
}
