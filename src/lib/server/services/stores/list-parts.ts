import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { paged, pageSize, type Paged } from '../../../schemas/listing';
import type { PartsQuery } from '../../../schemas/part';
import type { Context } from '../../context';
import * as prices from '../../db/queries/part-price';
import * as parts from '../../db/queries/part';

export interface PartRow {
	id: number;
	slug: string;
	kind: Awaited<ReturnType<typeof parts.list>>[number]['kind'];
	maker: string;
	model: string;
	samples: number;
	price: { amountMinor: number; currency: string; observedOn: string } | null;
}

/** One page of the parts, each with its latest price and how many samples there are of it: four queries, whatever the page holds. */
export async function listParts(
	ctx: Context,
	query: PartsQuery
): Promise<Outcome<Paged<PartRow>, 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const window = { limit: pageSize, offset: (query.page - 1) * pageSize };
	const [rows, total] = await Promise.all([
		parts.list(ctx.db, { ...query, ...window }),
		parts.total(ctx.db, query)
	]);
	const ids = rows.map((row) => row.id);
	const [latest, counts] = await Promise.all([prices.latestOf(ctx.db, ids), parts.sampleCounts(ctx.db, ids)]);
	const priceOf = new Map(
		latest.map(({ partId, amountMinor, currency, observedOn }) => [
			partId,
			{ amountMinor, currency, observedOn }
		])
	);
	const countOf = new Map(counts.map((row) => [row.partId, row.n]));
	return done(
		paged(
			rows.map(({ id, slug, kind, maker, model }) => ({
				id,
				slug,
				kind,
				maker,
				model,
				samples: countOf.get(id) ?? 0,
				price: priceOf.get(id) ?? null
			})),
			total,
			query.page
		)
	);
}
