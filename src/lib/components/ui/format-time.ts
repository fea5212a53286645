import { DateTime } from 'luxon';

export type TimeStyle = 'date' | 'time' | 'datetime' | 'relative';

/** A day of the calendar, which is the same day in every zone. */
const isDay = (at: Date | string): boolean => typeof at === 'string' && /^\d{4}-\d{2}-\d{2}$/.test(at);

const moment = (at: Date | string, zone: string) =>
	(at instanceof Date ? DateTime.fromJSDate(at) : DateTime.fromISO(at, { zone: isDay(at) ? zone : 'utc' }))
		.setZone(zone)
		.setLocale('en-GB');

const pattern: Record<Exclude<TimeStyle, 'relative'>, string> = {
	date: 'd MMMM yyyy',
	time: 'HH:mm',
	datetime: 'd MMMM yyyy, HH:mm'
};

/** A time in words in a zone. @example formatTime('2026-11-14T14:00:00Z', 'Europe/Berlin', 'datetime') // '14 November 2026, 15:00' */
export function formatTime(at: Date | string, zone: string, style: TimeStyle, now?: Date): string {
	const there = moment(at, zone);
	if (style !== 'relative') return there.toFormat(pattern[style]);
	return there.toRelative(now ? { base: DateTime.fromJSDate(now) } : {}) ?? there.toFormat(pattern.datetime);
}

/** The same time to the second with its offset from UTC. @example '14 November 2026, 15:00:00 (Europe/Berlin, UTC+01:00)' */
export const fullTime = (at: Date | string, zone: string): string =>
	isDay(at)
		? formatTime(at, zone, 'date')
		: moment(at, zone).toFormat(`d MMMM yyyy, HH:mm:ss '('z, 'UTC'ZZ')'`);

/** The form that machines read. */
export const isoTime = (at: Date | string, zone: string): string =>
	(isDay(at) ? moment(at, zone).toISODate() : moment(at, zone).toISO()) ?? '';
