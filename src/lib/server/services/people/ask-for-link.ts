import { done, type Outcome } from '../../../domain/shared/outcome';
import { countAttempt } from '../../auth/limits';
import type { OpenContext } from '../../context';
import * as people from '../../db/queries/people';
import { tooMany } from './too-many';

/** Whether a sign-in link is to be sent. The page says the same either way, so that nobody learns who works here. */
export async function askForLink(
	ctx: OpenContext,
	email: string,
	address: string
): Promise<Outcome<{ send: boolean }, 'too_many'>> {
	const waitMs = await countAttempt(ctx.db, { 'link-account': email, 'link-address': address });
	if (waitMs !== null)
		return tooMany(waitMs, 'Too many links were asked for.', 'A link sent before still works.');
	const person = await people.signInFacts(ctx.db, email);
	return done({ send: person?.mayEnter ?? false });
}
