import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as suites from '../../db/queries/suite';

export interface SuitePage {
	suite: Awaited<ReturnType<typeof suites.byRefs>>[number];
	/** In the suite's order. */
	workloads: Awaited<ReturnType<typeof suites.workloadsOf>>;
}

/** A suite by slug or id with its workloads and the readings each needs. */
export async function showSuite(
	ctx: Context,
	ref: string
): Promise<Outcome<SuitePage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [suite] = await suites.byRefs(ctx.db, [ref]);
	if (!suite) return refuse('not_found', `There is no suite “${ref}” on the bench.`);
	return done({ suite, workloads: await suites.workloadsOf(ctx.db, [suite.id]) });
}
