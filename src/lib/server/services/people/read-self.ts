import { may } from '../../../domain/people/policy';
import { scopesOf } from '../../../domain/people/token-scopes';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as apiTokens from '../../db/queries/api-tokens';
import * as people from '../../db/queries/people';
import * as sessions from '../../db/queries/sessions';

async function selfOf({ db, actor, now }: Context) {
	const [person, browsers, tokens, passwordHash] = await Promise.all([
		people.byId(db, actor.id),
		sessions.countOf(db, actor.id, now),
		apiTokens.ofUser(db, actor.id),
		people.passwordHashOf(db, actor.id)
	]);
	return (
		person && {
			person,
			roles: actor.roles,
			scopes: scopesOf(actor.roles),
			browsers,
			tokens,
			hasPassword: passwordHash !== null
		}
	);
}

/** What a person's own page shows. */
export async function readSelf(
	ctx: Context
): Promise<Outcome<NonNullable<Awaited<ReturnType<typeof selfOf>>>, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'account.use')) return refuse('forbidden', 'This page is for signed-in people.');
	const self = await selfOf(ctx);
	return self ? done(self) : refuse('not_found', 'Your account is no longer there.');
}
