import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { NameInput } from '../../../schemas/people';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as people from '../../db/queries/people';

/** Changes one's own name, as it stands in bylines from now on; editions already printed keep the old one. */
export async function renameSelf(
	ctx: Context,
	{ name, version }: NameInput
): Promise<Outcome<null, 'forbidden' | 'conflict'>> {
	const { id, name: before } = ctx.actor;
	if (!may(ctx.actor, 'account.use')) return refuse('forbidden', 'A token cannot change a name.');
	return inTransaction(ctx.db, async (tx) => {
		if (!(await people.update(tx, id, version, { name }))) {
			return refuse(
				'conflict',
				'Your entry was changed meanwhile. What you typed is kept; look again and save.'
			);
		}
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: id,
				act: 'person.rename',
				subjectKind: 'person',
				subjectId: id,
				before: { name: before },
				after: { name }
			}
		]);
		return done(null);
	});
}
