import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { SampleEdit } from '../../../schemas/sample';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as samples from '../../db/queries/sample';

/** Changes a sample over the version that was seen. */
export async function editSample(
	ctx: Context,
	ref: string,
	{ version, ...change }: SampleEdit
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'stores.edit')) return refuse('forbidden', 'Only testers and liaisons change samples.');
	return inTransaction(ctx.db, async (tx) => {
		const [before] = await samples.byRefs(tx, [ref]);
		if (!before) return refuse('not_found', `There is no sample “${ref}” in the stores.`);
		if (!(await samples.update(tx, before.id, version, change)))
			return changedMeanwhile('sample', before.version);
		const { serial, provenance, condition, place } = before;
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'sample.edit',
				subjectKind: 'sample',
				subjectId: before.id,
				before: { serial, provenance, condition, place },
				after: change
			}
		]);
		return done({ slug: before.slug });
	});
}
