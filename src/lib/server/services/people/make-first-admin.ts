import { randomUUID } from 'node:crypto';
import type { SystemContext } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';
import { makePasswordLink } from './password-link';

const linkHours = 24;

/** Makes somebody an admin from the machine itself, adding them if they are new, with a link to set a password. */
export async function makeFirstAdmin(
	{ db, now, origin }: SystemContext,
	email: string
): Promise<{ url: string; isNew: boolean; hours: number }> {
	return inTransaction(db, async (tx) => {
		const there = await people.signInFacts(tx, email);
		const id = there?.id ?? randomUUID();
		if (there) {
			await people.addRoles(tx, id, ['admin']);
			await people.reinstate(tx, id);
		} else {
			const name = email.split('@')[0] ?? email;
			const person = { id, name, email, passwordHash: null, emailVerified: null, createdAt: now };
			await people.insert(tx, person, ['admin']);
		}
		await audit.append(tx, [
			{
				at: now,
				actorId: null,
				act: 'person.first-admin',
				subjectKind: 'person',
				subjectId: id,
				after: { email }
			}
		]);
		const expires = new Date(now.getTime() + linkHours * 3_600_000);
		const { url } = await makePasswordLink(tx, origin, id, expires);
		return { url, isNew: !there, hours: linkHours };
	});
}
