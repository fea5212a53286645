import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as limits from '../../db/queries/lab-limit';

/** One limit of the lab. */
export async function showLimit(
	ctx: Context,
	id: number
): Promise<Outcome<NonNullable<Awaited<ReturnType<typeof limits.byId>>>, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const limit = await limits.byId(ctx.db, id);
	return limit ? done(limit) : refuse('not_found', 'There is no such limit.');
}
