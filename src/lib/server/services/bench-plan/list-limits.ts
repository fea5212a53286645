import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as limits from '../../db/queries/lab-limit';

export type LimitRow = Awaited<ReturnType<typeof limits.list>>[number];

/** Every limit of the lab. */
export async function listLimits(ctx: Context): Promise<Outcome<LimitRow[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	return done(await limits.list(ctx.db));
}
