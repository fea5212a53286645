import { letter } from '../../../domain/mail/letter';
import { done, type Outcome } from '../../../domain/shared/outcome';
import { countAttempt } from '../../auth/limits';
import type { OpenContext } from '../../context';
import { inTransaction } from '../../db/client';
import * as people from '../../db/queries/people';
import * as settings from '../../db/queries/settings';
import { post } from '../../jobs/outbox';
import { makePasswordLink } from './password-link';
import { tooMany } from './too-many';

const linkMinutes = 60;

/** Mails a link to set a new password, to somebody who may sign in; to others nothing, and the page says the same. */
export async function askForPasswordLink(
	ctx: OpenContext,
	email: string,
	address: string
): Promise<Outcome<null, 'too_many'>> {
	const waitMs = await countAttempt(ctx.db, { 'link-account': email, 'link-address': address });
	if (waitMs !== null)
		return tooMany(waitMs, 'Too many links were asked for.', 'A link sent before still works.');
	const person = await people.signInFacts(ctx.db, email);
	if (!person?.mayEnter) return done(null);
	await inTransaction(ctx.db, async (tx) => {
		const expires = new Date(ctx.now.getTime() + linkMinutes * 60_000);
		const { url, hash } = await makePasswordLink(tx, ctx.origin, person.id, expires);
		const { name } = await settings.publication(tx);
		const words = letter({
			subject: `Set a new password for ${name}`,
			paragraphs: [
				`Hello ${person.name},`,
				`you asked to set a new password. The link works once, within ${linkMinutes} minutes.`
			],
			link: { label: 'Set a new password', href: url },
			publication: name,
			because: 'If you did not ask for it, do nothing: your password stays as it is.'
		});
		const messageId = `password.${hash.slice(0, 32)}@${new URL(ctx.origin).hostname}`;
		await post(tx, ctx.now, [{ messageId, recipient: person.email, ...words }]);
	});
	return done(null);
}
