import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';

async function personOf(ctx: Context, id: string) {
	const manages = may(ctx.actor, 'people.manage');
	const [person, held, history] = await Promise.all([
		people.byId(ctx.db, id),
		people.rolesOf(ctx.db, [id]),
		manages ? audit.ofSubject(ctx.db, 'person', id, 50) : []
	]);
	return person && { person, roles: held.map((row) => row.role), manages, history };
}

/** One person with their roles; to an admin also what was done to their entry. */
export async function readPerson(
	ctx: Context,
	id: string
): Promise<Outcome<NonNullable<Awaited<ReturnType<typeof personOf>>>, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'people.read'))
		return refuse('forbidden', 'Your roles do not include the list of people.');
	const found = await personOf(ctx, id);
	return found ? done(found) : refuse('not_found', 'There is no such person.');
}
