import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { MeaningsApiQuery } from '../../../schemas/firmware-meaning';
import type { Context } from '../../context';
import * as meanings from '../../db/queries/firmware-meaning';

export type MeaningItem = Awaited<ReturnType<typeof meanings.page>>[number];

/** Meanings in the order they were written down, one more than asked for where there are more. */
export async function listMeaningsForApi(
	ctx: Context,
	query: MeaningsApiQuery
): Promise<Outcome<MeaningItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	return done(await meanings.page(ctx.db, { ...query, limit: query.limit + 1 }));
}

/** One meaning of a setting by its id. */
export async function meaningForApi(
	ctx: Context,
	id: number
): Promise<Outcome<MeaningItem, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const row = await meanings.whole(ctx.db, id);
	return row ? done(row) : refuse('not_found', 'There is no such meaning.');
}
