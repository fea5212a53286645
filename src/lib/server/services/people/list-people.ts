import { may } from '../../../domain/people/policy';
import type { Role } from '../../../domain/people/roles';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize } from '../../../schemas/listing';
import type { PeopleQuery } from '../../../schemas/people';
import type { Context } from '../../context';
import * as people from '../../db/queries/people';

async function pageOf({ db }: Context, { q, role, state, page }: PeopleQuery) {
	const filter = { text: q || undefined, role: role || undefined, state };
	const { rows, total } = await people.list(db, filter, { limit: pageSize, offset: (page - 1) * pageSize });
	const held = new Map<string, Role[]>(rows.map((row) => [row.id, []]));
	for (const { userId, role } of await people.rolesOf(db, [...held.keys()])) held.get(userId)?.push(role);
	return paged(
		rows.map((row) => ({ ...row, roles: held.get(row.id) ?? [] })),
		total,
		page
	);
}

/** One page of the people, with their roles. */
export async function listPeople(
	ctx: Context,
	query: PeopleQuery
): Promise<Outcome<Awaited<ReturnType<typeof pageOf>>, 'forbidden'>> {
	if (!may(ctx.actor, 'people.read'))
		return refuse('forbidden', 'Your roles do not include the list of people.');
	return done(await pageOf(ctx, query));
}
