import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { hashPassword } from '../../auth/password';
import type { OpenContext } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';
import * as sessions from '../../db/queries/sessions';
import { splitPasswordLink } from './password-link';

const spent = () =>
	refuse(
		'gone',
		'This link was used, was replaced by a newer one, or its time has run out. Your password is as it was.'
	);

/** Whom a password link is for, without using it. */
export async function readPasswordLink(
	ctx: OpenContext,
	link: string
): Promise<Outcome<{ name: string; email: string }, 'gone'>> {
	const parts = splitPasswordLink(link);
	const row = parts && (await sessions.readVerificationToken(ctx.db, parts.identifier, parts.token));
	if (!row || row.expires <= ctx.now) return spent();
	const person = await people.byId(ctx.db, parts.userId);
	return person && !person.leftAt ? done({ name: person.name, email: person.email }) : spent();
}

/** Sets a password with a link from a mail, uses the link up and signs every other browser out. */
export async function setPasswordByLink(
	ctx: OpenContext,
	link: string,
	password: string
): Promise<Outcome<{ userId: string }, 'gone'>> {
	const parts = splitPasswordLink(link);
	if (!parts) return spent();
	const passwordHash = await hashPassword(password);
	return inTransaction(ctx.db, async (tx) => {
		const row = await sessions.takeVerificationToken(tx, parts.identifier, parts.token);
		const person = await people.byId(tx, parts.userId);
		if (!row || row.expires <= ctx.now || !person || person.leftAt) return spent();
		await people.setPassword(tx, person.id, passwordHash);
		await sessions.dropVerificationTokens(tx, parts.identifier);
		await sessions.endAll(tx, person.id);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: person.id,
				act: 'person.password',
				subjectKind: 'person',
				subjectId: person.id,
				reason: 'by a link'
			}
		]);
		return done({ userId: person.id });
	});
}
