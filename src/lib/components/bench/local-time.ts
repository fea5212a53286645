import { DateTime } from 'luxon';

/** A time as a `datetime-local` field takes it, to the second, in a zone. */
export const localTime = (at: Date, zone: string): string =>
	DateTime.fromJSDate(at).setZone(zone).toFormat("yyyy-MM-dd'T'HH:mm:ss");
