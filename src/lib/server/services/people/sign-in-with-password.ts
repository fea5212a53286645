import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { SignInInput } from '../../../schemas/people';
import { countAttempt, forgiveAttempt } from '../../auth/limits';
import { passwordFits } from '../../auth/password';
import type { OpenContext } from '../../context';
import * as people from '../../db/queries/people';
import { tooMany } from './too-many';

/**
 * Whose password this is. An address nobody has, a wrong password, somebody who has left and somebody without a role
 * get the same answer after the same work.
 */
export async function signInWithPassword(
	ctx: OpenContext,
	{ email, password }: Pick<SignInInput, 'email' | 'password'>,
	address: string
): Promise<Outcome<{ userId: string }, 'invalid' | 'too_many'>> {
	const waitMs = await countAttempt(ctx.db, { 'password-account': email, 'password-address': address });
	if (waitMs !== null) {
		return tooMany(
			waitMs,
			'Too many attempts to sign in. Nothing was changed.',
			'An e-mailed link works meanwhile.'
		);
	}
	const person = await people.signInFacts(ctx.db, email);
	const fits = await passwordFits(person?.passwordHash, password);
	if (!person?.mayEnter || !fits) {
		return refuse(
			'invalid',
			'The address and the password do not go together. Check both, or have a link sent.'
		);
	}
	await forgiveAttempt(ctx.db, email, address);
	return done({ userId: person.id });
}
