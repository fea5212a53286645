import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { RolesInput } from '../../../schemas/people';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';
import { refuseForLastAdmin } from './last-admin';

/** Gives and takes roles until the person has exactly these. */
export async function setRoles(
	ctx: Context,
	personId: string,
	{ roles, version }: RolesInput
): Promise<Outcome<null, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'people.manage')) return refuse('forbidden', 'Only an admin gives and takes roles.');
	return inTransaction(ctx.db, async (tx) => {
		const last = await refuseForLastAdmin(tx, personId);
		if (last && !roles.includes('admin')) return last;
		if (!(await people.byId(tx, personId))) return refuse('not_found', 'There is no such person.');
		if (!(await people.update(tx, personId, version, {}))) {
			return refuse(
				'conflict',
				'Somebody else changed this person meanwhile. Nothing was changed; look again and save.'
			);
		}
		const before = (await people.rolesOf(tx, [personId])).map((row) => row.role);
		await people.removeRoles(
			tx,
			personId,
			before.filter((role) => !roles.includes(role))
		);
		await people.addRoles(
			tx,
			personId,
			roles.filter((role) => !before.includes(role))
		);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'person.roles',
				subjectKind: 'person',
				subjectId: personId,
				before: { roles: before },
				after: { roles }
			}
		]);
		return done(null);
	});
}
