import { may } from '../../../domain/people/policy';
import type { Role } from '../../../domain/people/roles';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as people from '../../db/queries/people';

export const peoplePerPage = 50;

async function pageOf({ db }: Context, filter: people.PeopleFilter, page: number) {
	const { rows, total } = await people.list(db, filter, {
		limit: peoplePerPage,
		offset: (page - 1) * peoplePerPage
	});
	const held = new Map<string, Role[]>(rows.map((row) => [row.id, []]));
	for (const { userId, role } of await people.rolesOf(db, [...held.keys()])) held.get(userId)?.push(role);
	return {
		people: rows.map((row) => ({ ...row, roles: held.get(row.id) ?? [] })),
		total,
		page,
		pages: Math.max(1, Math.ceil(total / peoplePerPage))
	};
}

/** One page of the people here, with their roles. */
export async function listPeople(
	ctx: Context,
	filter: people.PeopleFilter,
	page: number
): Promise<Outcome<Awaited<ReturnType<typeof pageOf>>, 'forbidden'>> {
	if (!may(ctx.actor, 'people.read'))
		return refuse('forbidden', 'Your roles do not include the list of people.');
	return done(await pageOf(ctx, filter, page));
}
