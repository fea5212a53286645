import { DateTime } from 'luxon';
import { parseReading } from '../../../domain/bench/numbers';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';

/** A time as a local field gives it, in the publication's zone; null for an empty field. */
export function readStarted(typed: string, zone: string): Outcome<Date | null, 'invalid'> {
	if (typed === '') return done(null);
	const time = DateTime.fromISO(typed, { zone });
	if (time.isValid && time.year >= 1990 && time.year <= 2200) return done(time.toJSDate());
	const message = 'Write the time as 2026-11-11T09:30.';
	return refuse('invalid', message, { fields: { started: [message] } });
}

/** An ambient temperature as typed, in °C; null for an empty field. */
export function readAmbient(typed: string): Outcome<number | null, 'invalid'> {
	if (typed === '') return done(null);
	const parsed = parseReading(typed);
	const message = parsed.ok
		? parsed.value >= -60 && parsed.value <= 100
			? null
			: 'The ambient temperature is between −60 and 100 °C.'
		: parsed.message;
	if (parsed.ok && message === null) return done(parsed.value);
	return refuse('invalid', message ?? '', { fields: { ambient: [message ?? ''] } });
}

/** The end of a day in the publication's zone; null for an empty field. */
export function endOfDay(day: string, zone: string): Date | null {
	return day === '' ? null : DateTime.fromISO(day, { zone }).endOf('day').toJSDate();
}
