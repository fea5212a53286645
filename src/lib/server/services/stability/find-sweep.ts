import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as sweeps from '../../db/queries/sweep';

/** A sweep by slug or id, for the other services here, which have asked whether the actor may. */
export async function findSweep(
	{ db }: Pick<Context, 'db'>,
	ref: string
): Promise<Outcome<sweeps.SweepRow, 'not_found'>> {
	const [row] = await sweeps.byRefs(db, [ref]);
	return row ? done(row) : refuse('not_found', `There is no sweep “${ref}” on the bench.`);
}
