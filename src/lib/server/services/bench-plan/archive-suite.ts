import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { changedMeanwhile } from '../../../domain/shared/refusals';
import type { SuiteArchive } from '../../../schemas/suite';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as suites from '../../db/queries/suite';

/** Puts a suite away, or takes it out again. */
export async function archiveSuite(
	ctx: Context,
	ref: string,
	{ archived, version }: SuiteArchive
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'conflict'>> {
	if (!may(ctx.actor, 'bench.plan')) return refuse('forbidden', 'Only testers archive suites.');
	return inTransaction(ctx.db, async (tx) => {
		const [suite] = await suites.byRefs(tx, [ref]);
		if (!suite) return refuse('not_found', `There is no suite “${ref}” on the bench.`);
		const archivedAt = archived === 'yes' ? (suite.archivedAt ?? ctx.now) : null;
		if (!(await suites.update(tx, suite.id, version, { archivedAt })))
			return changedMeanwhile('suite', suite.version);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'suite.archive',
				subjectKind: 'suite',
				subjectId: suite.id,
				before: { archived: suite.archivedAt !== null },
				after: { archived: archived === 'yes' }
			}
		]);
		return done({ slug: suite.slug });
	});
}
