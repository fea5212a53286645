import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as instruments from '../../db/queries/instrument';

export interface InstrumentPage {
	instrument: Awaited<ReturnType<typeof instruments.byRefs>>[number];
	uses: Awaited<ReturnType<typeof instruments.usesOf>>;
}

/** An instrument by slug or id, with the columns of campaigns that name it. */
export async function showInstrument(
	ctx: Context,
	ref: string
): Promise<Outcome<InstrumentPage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'bench.read')) return refuse('forbidden', 'Your roles do not include the bench.');
	const [instrument] = await instruments.byRefs(ctx.db, [ref]);
	if (!instrument) return refuse('not_found', `There is no instrument “${ref}” in the lab.`);
	return done({ instrument, uses: await instruments.usesOf(ctx.db, [instrument.id]) });
}
