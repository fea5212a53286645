import { DateTime } from 'luxon';

export const demoZone = 'Europe/Oslo';

/** Dates around the moment of the fill, so that the demo is always in the middle of its fortnight. */
export interface Calendar {
	now: Date;
	/** A time of day in the publication's zone, `day` days from today. @example at(-3, '09:30') */
	at: (day: number, time: string) => Date;
	/** The same as a local field would hold it, for slots and embargoes. */
	local: (day: number, time: string) => string;
	/** The day alone, as 2026-11-11. */
	date: (day: number) => string;
}

export function calendarAround(now: Date): Calendar {
	const today = DateTime.fromJSDate(now, { zone: demoZone }).startOf('day');
	const moment = (day: number, time: string): DateTime => {
		const [hour, minute] = time.split(':').map(Number);
		return today.plus({ days: day }).set({ hour, minute });
	};
	return {
		now,
		at: (day, time) => moment(day, time).toJSDate(),
		local: (day, time) => moment(day, time).toFormat("yyyy-MM-dd'T'HH:mm"),
		date: (day) => moment(day, '12:00').toFormat('yyyy-MM-dd')
	};
}
