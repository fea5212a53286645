const months = [
	'January',
	'February',
	'March',
	'April',
	'May',
	'June',
	'July',
	'August',
	'September',
	'October',
	'November',
	'December'
];

/** A calendar of each zone: making one costs more than all that is printed with it. */
const calendars = new Map<string, Intl.DateTimeFormat>();

function calendarOf(zone: string): Intl.DateTimeFormat {
	const known = calendars.get(zone);
	if (known) return known;
	const calendar = new Intl.DateTimeFormat('en-GB', {
		timeZone: zone,
		year: 'numeric',
		month: 'numeric',
		day: 'numeric'
	});
	calendars.set(zone, calendar);
	return calendar;
}

/** Year, month and day of a moment in a zone; spelled out here, so that every platform prints the same words. */
function dayIn(iso: string, zone: string): [year: number, month: number, day: number] {
	const parts = calendarOf(zone).formatToParts(new Date(iso));
	const part = (type: string) => Number(parts.find((one) => one.type === type)?.value);
	return [part('year'), part('month'), part('day')];
}

const month = (number: number): string => months[number - 1] ?? '';

/** A calendar date as it is printed. @example printedDay('2026-11-09') === '9 November 2026' */
export function printedDay(date: string): string {
	const [year, number, day] = date.slice(0, 10).split('-').map(Number);
	return `${day} ${month(number ?? 0)} ${year}`;
}

/**
 * The days that moments fall on, as one span; empty for none.
 * @param moments ISO times
 * @example printedDates(['2026-11-09T10:00:00Z', '2026-11-11T09:00:00Z'], 'Europe/Oslo') === '9 to 11 November 2026'
 */
export function printedDates(moments: readonly string[], zone: string): string {
	const sorted = [...moments].sort();
	const first = sorted[0];
	const last = sorted.at(-1);
	if (first === undefined || last === undefined) return '';
	const [y1, m1, d1] = dayIn(first, zone);
	const [y2, m2, d2] = dayIn(last, zone);
	const end = `${d2} ${month(m2)} ${y2}`;
	if (y1 !== y2) return `${d1} ${month(m1)} ${y1} to ${end}`;
	if (m1 !== m2) return `${d1} ${month(m1)} to ${end}`;
	return d1 === d2 ? end : `${d1} to ${end}`;
}
