import { may } from '../../../domain/people/policy';
import { scopesOf } from '../../../domain/people/token-scopes';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { TokenInput } from '../../../schemas/people';
import { hashOf, newSecret } from '../../auth/secret';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as apiTokens from '../../db/queries/api-tokens';
import * as audit from '../../db/queries/audit';

const dayMs = 86_400_000;

/** Makes a personal token. It is returned this once; only its hash is stored. */
export async function createToken(
	ctx: Context,
	{ name, scopes, days }: TokenInput
): Promise<Outcome<{ id: number; token: string }, 'forbidden' | 'invalid'>> {
	const { id: userId, roles } = ctx.actor;
	if (!may(ctx.actor, 'account.use')) return refuse('forbidden', 'A token cannot make tokens.');
	const useless = scopes.filter((scope) => !scopesOf(roles).includes(scope));
	if (useless.length > 0) {
		const message = `Your roles do not include ${useless.join(', ')}.`;
		return refuse('invalid', `${message} No token was made.`, { fields: { scopes: [message] } });
	}
	const token = `calipress_${newSecret()}`;
	const expiresAt = days === 'never' ? null : new Date(ctx.now.getTime() + Number(days) * dayMs);
	return inTransaction(ctx.db, async (tx) => {
		const row = {
			userId,
			name,
			scopes: [...new Set(scopes)],
			tokenHash: hashOf(token),
			createdAt: ctx.now,
			expiresAt
		};
		const id = await apiTokens.insert(tx, row);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: userId,
				act: 'token.create',
				subjectKind: 'token',
				subjectId: id,
				after: { name, scopes, expiresAt }
			}
		]);
		return done({ id, token });
	});
}
