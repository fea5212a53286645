import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PasswordChange } from '../../../schemas/people';
import { countAttempt, forgiveAttempt } from '../../auth/limits';
import { hashPassword, passwordFits } from '../../auth/password';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';
import * as sessions from '../../db/queries/sessions';
import { tooMany } from './too-many';

/** Changes one's own password, knowing the one before; other browsers are signed out. */
export async function changePassword(
	ctx: Context,
	{ current, password }: PasswordChange,
	{ address, sessionToken }: { address: string; sessionToken?: string }
): Promise<Outcome<null, 'forbidden' | 'invalid' | 'too_many'>> {
	const { id, email } = ctx.actor;
	if (!may(ctx.actor, 'account.use')) return refuse('forbidden', 'A token cannot change a password.');
	const waitMs = await countAttempt(ctx.db, { 'password-account': email, 'password-address': address });
	if (waitMs !== null) return tooMany(waitMs, 'Too many attempts. Your password is as it was.');
	if (!(await passwordFits(await people.passwordHashOf(ctx.db, id), current))) {
		const message = 'This is not your password. If you have none yet, have a link sent to set one.';
		return refuse('invalid', 'Your password is as it was.', { fields: { current: [message] } });
	}
	await forgiveAttempt(ctx.db, email, address);
	const passwordHash = await hashPassword(password);
	await inTransaction(ctx.db, async (tx) => {
		await people.setPassword(tx, id, passwordHash);
		await sessions.endAll(tx, id, sessionToken);
		await audit.append(tx, [
			{ at: ctx.now, actorId: id, act: 'person.password', subjectKind: 'person', subjectId: id }
		]);
	});
	return done(null);
}
