import { may } from '../../../domain/people/policy';
import { decimalAmount } from '../../../domain/shared/money';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PartsApiQuery } from '../../../schemas/part';
import type { Context } from '../../context';
import * as prices from '../../db/queries/part-price';
import * as parts from '../../db/queries/part';

type Part = Awaited<ReturnType<typeof parts.list>>[number];
type Price = Awaited<ReturnType<typeof prices.latestOf>>[number];

const describePrice = ({ amountMinor, currency, observedOn, source }: Omit<Price, 'partId'>) => ({
	amount: decimalAmount(amountMinor, currency),
	amountMinor,
	currency,
	observedOn,
	source
});

const describePart = ({ id, slug, kind, maker, model, specification, createdAt }: Part, latest?: Price) => ({
	id,
	slug,
	kind,
	maker,
	model,
	specification,
	price: latest ? describePrice(latest) : null,
	createdAt
});

export type PartItem = ReturnType<typeof describePart>;

/** Parts in the order they were added, one more than asked for where there are more. */
export async function listPartsForApi(
	ctx: Context,
	query: PartsApiQuery
): Promise<Outcome<PartItem[], 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const rows = await parts.list(ctx.db, {
		...query,
		sort: 'id',
		way: 'up',
		limit: query.limit + 1,
		offset: 0
	});
	const latest = await prices.latestOf(
		ctx.db,
		rows.map((row) => row.id)
	);
	const priceOf = new Map(latest.map((price) => [price.partId, price]));
	return done(rows.map((row) => describePart(row, priceOf.get(row.id))));
}

/** A part by slug or id with every price seen, the latest first. */
export async function partForApi(
	ctx: Context,
	ref: string
): Promise<Outcome<PartItem & { prices: ReturnType<typeof describePrice>[] }, 'forbidden' | 'not_found'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const [part] = await parts.byRefs(ctx.db, [ref]);
	if (!part) return refuse('not_found', `There is no part “${ref}” in the stores.`);
	const seen = await prices.ofParts(ctx.db, [part.id]);
	return done({ ...describePart(part, seen[0]), prices: seen.map(describePrice) });
}
