import { DateTime } from 'luxon';

export type FortnightKind = 'planned' | 'scheduled' | 'published' | 'embargo' | 'loan';

/** What stands on a day of the calendar. */
export interface FortnightEvent {
	kind: FortnightKind;
	/** When; null for a whole day. */
	at: Date | null;
	title: string;
	href: string | null;
}

export interface FortnightDay {
	/** ISO date in the publication's zone. */
	date: string;
	/** Such as 'Mon 9'. */
	label: string;
	isToday: boolean;
	events: (FortnightEvent & { time: string | null })[];
}

/** The two weeks from this week's Monday, in the publication's zone, as moments and as days. */
export function fortnightSpan(
	now: Date,
	zone: string
): { from: Date; to: Date; firstDay: string; endDay: string } {
	const monday = DateTime.fromJSDate(now, { zone }).startOf('week');
	const end = monday.plus({ days: 14 });
	return {
		from: monday.toJSDate(),
		to: end.toJSDate(),
		firstDay: monday.toFormat('yyyy-LL-dd'),
		endDay: end.toFormat('yyyy-LL-dd')
	};
}

/** Puts events on the fourteen days of their fortnight. `day` of an all-day event is an ISO date. */
export function fortnight(
	now: Date,
	zone: string,
	events: (FortnightEvent & { day?: string })[]
): FortnightDay[] {
	const today = DateTime.fromJSDate(now, { zone }).toFormat('yyyy-LL-dd');
	const monday = DateTime.fromJSDate(now, { zone }).startOf('week').setLocale('en-GB');
	const placed = events.map(({ day, ...event }) => {
		const local = event.at && DateTime.fromJSDate(event.at, { zone });
		return { ...event, day: day ?? local?.toFormat('yyyy-LL-dd'), time: local?.toFormat('HH:mm') ?? null };
	});
	return Array.from({ length: 14 }, (_, index) => {
		const day = monday.plus({ days: index });
		const date = day.toFormat('yyyy-LL-dd');
		return {
			date,
			label: day.toFormat('ccc d'),
			isToday: date === today,
			events: placed
				.filter((event) => event.day === date)
				.sort((a, b) => (a.time ?? '').localeCompare(b.time ?? ''))
				.map(({ kind, at, title, href, time }) => ({ kind, at, title, href, time }))
		};
	});
}
