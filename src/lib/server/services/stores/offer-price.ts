import { DateTime } from 'luxon';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as prices from '../../db/queries/part-price';
import * as settings from '../../db/queries/settings';

/** What a form for a price starts with: today in the publication's zone, and the currency used last. */
export async function offerPrice(
	ctx: Context
): Promise<Outcome<{ today: string; currency: string }, 'forbidden'>> {
	if (!may(ctx.actor, 'stores.read')) return refuse('forbidden', 'Your roles do not include the stores.');
	const [{ zone }, currency] = await Promise.all([settings.publication(ctx.db), prices.lastCurrency(ctx.db)]);
	const today = DateTime.fromJSDate(ctx.now, { zone }).toFormat('yyyy-MM-dd');
	return done({ today, currency: currency ?? 'USD' });
}
