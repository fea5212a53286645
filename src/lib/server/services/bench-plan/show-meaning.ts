import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as meanings from '../../db/queries/firmware-meaning';

/** One line of what a firmware's settings set. */
export async function showMeaning(
	ctx: Context,
	id: number
): Promise<Outcome<NonNullable<Awaited<ReturnType<typeof meanings.byId>>>, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const meaning = await meanings.byId(ctx.db, id);
	return meaning ? done(meaning) : refuse('not_found', 'There is no such meaning.');
}
