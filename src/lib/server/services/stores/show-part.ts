import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as prices from '../../db/queries/part-price';
import * as parts from '../../db/queries/part';
import * as samples from '../../db/queries/sample';

async function pageOf(ctx: Context, ref: string) {
	const [part] = await parts.byRefs(ctx.db, [ref]);
	if (!part) return null;
	const [seen, units] = await Promise.all([
		prices.ofParts(ctx.db, [part.id]),
		samples.ofParts(ctx.db, [part.id])
	]);
	const unitIds = units.map((unit) => unit.id);
	const [rigs, campaigns] = await Promise.all([
		samples.rigsOf(ctx.db, unitIds),
		// Names of campaigns tell who works on what; results stay with the bench.
		may(ctx.actor, 'usage.read') || may(ctx.actor, 'bench.read') ? samples.campaignsOf(ctx.db, unitIds) : []
	]);
	return { part, prices: seen, samples: units, rigs, campaigns };
}

export type PartPage = NonNullable<Awaited<ReturnType<typeof pageOf>>>;

/** A part by slug or id: its specification, prices seen, samples, and where those are used. */
export async function showPart(
	ctx: Context,
	ref: string
): Promise<Outcome<PartPage, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const page = await pageOf(ctx, ref);
	return page ? done(page) : refuse('not_found', `There is no part “${ref}” in the stores.`);
}
