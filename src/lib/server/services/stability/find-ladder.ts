import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as ladders from '../../db/queries/ladder';

/** A ladder by slug or id, for the other services here, which have asked whether the actor may. */
export async function findLadder(
	{ db }: Pick<Context, 'db'>,
	ref: string
): Promise<Outcome<ladders.LadderRow, 'not_found'>> {
	const [row] = await ladders.byRefs(db, [ref]);
	return row ? done(row) : refuse('not_found', `There is no ladder “${ref}” on the bench.`);
}
