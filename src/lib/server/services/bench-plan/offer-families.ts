import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as meanings from '../../db/queries/firmware-meaning';

/** The firmware families there are, to choose among while one is typed. */
export async function offerFamilies(ctx: Context): Promise<Outcome<string[], 'forbidden'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	return done(await meanings.families(ctx.db));
}
