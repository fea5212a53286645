import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { partKinds } from '../../../domain/stores/words';
import type { Context } from '../../context';
import * as samples from '../../db/queries/sample';

export type SampleChoice = Awaited<ReturnType<typeof samples.choices>>[number];

/** Every sample in the order a parts list prints them, for a rig to choose from. */
export async function chooseSamples(ctx: Context): Promise<Outcome<SampleChoice[], 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const rows = await samples.choices(ctx.db);
	return done(rows.toSorted((a, b) => partKinds.indexOf(a.kind) - partKinds.indexOf(b.kind)));
}
