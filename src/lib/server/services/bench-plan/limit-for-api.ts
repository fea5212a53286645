import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { LimitsApiQuery } from '../../../schemas/lab-limit';
import type { Context } from '../../context';
import * as limits from '../../db/queries/lab-limit';

export type LimitItem = Awaited<ReturnType<typeof limits.page>>[number];

/** Limits in the order they were written down, one more than asked for where there are more. */
export async function listLimitsForApi(
	ctx: Context,
	query: LimitsApiQuery
): Promise<Outcome<LimitItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	return done(await limits.page(ctx.db, { ...query, limit: query.limit + 1 }));
}

/** One limit of the lab by its id. */
export async function limitForApi(
	ctx: Context,
	id: number
): Promise<Outcome<LimitItem, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const row = await limits.whole(ctx.db, id);
	return row ? done(row) : refuse('not_found', 'There is no such limit.');
}
