import { DateTime } from 'luxon';

/** A date for print, in the publication's zone. @example printedDate(new Date('2026-11-14T14:00Z'), 'Europe/Oslo') // '14 November 2026' */
export const printedDate = (at: Date, zone: string): string =>
	DateTime.fromJSDate(at, { zone }).setLocale('en-GB').toFormat('d LLLL yyyy');
