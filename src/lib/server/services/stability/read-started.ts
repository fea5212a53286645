import { DateTime } from 'luxon';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { Context } from '../../context';
import * as settings from '../../db/queries/settings';

/** A local time as its field gives it, in the publication's zone; null for an empty field. */
export async function readStarted(
	{ db }: Pick<Context, 'db'>,
	typed: string
): Promise<Outcome<Date | null, 'invalid'>> {
	if (typed === '') return done(null);
	const { zone } = await settings.publication(db);
	const time = DateTime.fromISO(typed, { zone });
	if (time.isValid && time.year >= 1990 && time.year <= 2200) return done(time.toJSDate());
	return refuse('invalid', 'Nothing was stored: mend the time and send it again.', {
		fields: { started: ['Write the time as 2026-11-11T09:30.'] }
	});
}
