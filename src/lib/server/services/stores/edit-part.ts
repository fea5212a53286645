import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { PartEdit } from '../../../schemas/part';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as parts from '../../db/queries/part';

/** Changes a part over the version that was seen. */
export async function editPart(
	ctx: Context,
	ref: string,
	{ version, ...change }: PartEdit
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'stores.edit')) return refuse('forbidden', 'Only testers and liaisons change parts.');
	return inTransaction(ctx.db, async (tx) => {
		const [before] = await parts.byRefs(tx, [ref]);
		if (!before) return refuse('not_found', `There is no part “${ref}” in the stores.`);
		if (!(await parts.update(tx, before.id, version, change)))
			return changedMeanwhile('part', before.version);
		const { kind, maker, model, specification } = before;
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'part.edit',
				subjectKind: 'part',
				subjectId: before.id,
				before: { kind, maker, model, specification },
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}
