import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { PriceInput } from '../../../schemas/part';
import type { Context } from '../../context';
import { inTransaction } from '../../db/client';
import * as audit from '../../db/queries/audit';
import * as prices from '../../db/queries/part-price';
import * as parts from '../../db/queries/part';

/** Whether a day has begun nowhere on earth yet; clocks run up to 14 hours ahead of UTC. */
export const notYetSeen = (now: Date, day: string): boolean =>
	day > new Date(now.getTime() + 14 * 3_600_000).toISOString().slice(0, 10);

/** Notes a price seen on a date; earlier ones stay. */
export async function addPartPrice(
	ctx: Context,
	ref: string,
	price: PriceInput
): Promise<Outcome<{ slug: string }, 'forbidden' | 'not_found' | 'invalid'>> {
	if (!may(ctx.actor, 'stores.edit')) return refuse('forbidden', 'Only testers and liaisons note prices.');
	if (notYetSeen(ctx.now, price.observedOn))
		return refuse('invalid', 'The price was not saved.', {
			fields: { observedOn: ['This day is still to come.'] }
		});
	return inTransaction(ctx.db, async (tx) => {
		const [part] = await parts.byRefs(tx, [ref]);
		if (!part) return refuse('not_found', `There is no part “${ref}” in the stores.`);
		await prices.insert(tx, [{ ...price, partId: part.id, createdAt: ctx.now }]);
		await audit.append(tx, [
			{
				at: ctx.now,
				actorId: ctx.actor.id,
				act: 'part.price',
				subjectKind: 'part',
				subjectId: part.id,
				after: price
			}
		]);
		return done({ slug: part.slug });
	});
}
