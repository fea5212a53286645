import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { SuiteEdit } from '../../../schemas/suite';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as suites from '../../db/queries/suite';
import { suiteWorkloads } from './suite-workloads';

/** Changes a suite over the version that was seen; campaigns planned from it stay as they were planned. */
export async function editSuite(
	ctx: Context,
	ref: string,
	{ version, ...input }: SuiteEdit
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'invalid' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers change suites.');
	const { name, purpose } = input;
	return inTransaction(ctx.db, async (tx) => {
		const [suite] = await suites.byRefs(tx, [ref]);
		if (!suite) return refuse('not_found', `There is no suite “${ref}” on the bench.`);
		if (suite.archivedAt)
			return refuse(
				'conflict',
				'This suite is archived. Nothing was saved; take it out of the archive first.'
			);
		const chosen = await suiteWorkloads(tx, input.workloads);
		if (!chosen.ok) return chosen;
		const before = await suites.workloadsOf(tx, [suite.id]);
		if (!(await suites.update(tx, suite.id, version, { name, purpose }, chosen.value)))
			return changedMeanwhile('suite', suite.version);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'suite.edit',
				subjectKind: 'suite',
				subjectId: suite.id,
				before: {
					name: suite.name,
					purpose: suite.purpose,
					workloads: before.map(({ slug, repeats }) => ({ workload: slug, repeats }))
				},
				after: input
			}
		]);
		return done({ slug: suite.slug });
	});
}
