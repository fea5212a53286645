import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as parts from '../../db/queries/part';

type Choice = Awaited<ReturnType<typeof parts.names>>[number];

/** Every part by name, for a form to choose from. */
export async function choosePart(ctx: Context): Promise<Outcome<Choice[], 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	return done(await parts.names(ctx.db));
}
