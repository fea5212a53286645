import { DateTime } from 'luxon';

/** A slot that was read, or why it cannot be one. */
export type SlotReading = { ok: true; at: Date } | { ok: false; message: string };

const localShape = "yyyy-LL-dd'T'HH:mm";

/**
 * Reads a local date and time of the publication's zone. A time that the clocks skip is refused; of one that
 * they show twice the first is meant.
 * @example slotFromLocal('2026-03-29T02:30', 'Europe/Oslo') // refused: clocks go from 02:00 to 03:00
 */
export function slotFromLocal(local: string, zone: string): SlotReading {
	const read = DateTime.fromFormat(local, localShape, { zone });
	if (!read.isValid) return { ok: false, message: 'This is not a date and time, such as 2026-11-14T15:00.' };
	if (read.toFormat(localShape) !== local)
		return {
			ok: false,
			message: `${local.replace('T', ', ')} does not exist in ${zone}: the clocks go forward over it. ${read.toFormat('HH:mm')} is the next time that does.`
		};
	const [first] = read.getPossibleOffsets().sort((a, b) => a.toMillis() - b.toMillis());
	return { ok: true, at: (first ?? read).toJSDate() };
}

/** A moment as the form's date-and-time field takes it, in the publication's zone. */
export const localOf = (at: Date, zone: string): string =>
	DateTime.fromJSDate(at, { zone }).toFormat(localShape);

/** A moment in words, with the zone's own name for its offset. @example slotWords(at, 'Europe/Oslo') // 'Saturday 14 November 2026, 15:00 (CET)' */
export function slotWords(at: Date, zone: string): string {
	const local = DateTime.fromJSDate(at, { zone }).setLocale('en-GB');
	return `${local.toFormat('cccc d LLLL yyyy, HH:mm')} (${local.toFormat('ZZZZ')})`;
}

/** A moment in few words for a table. @example slotShort(at, 'Europe/Oslo') // 'Sat 14 Nov, 15:00' */
export const slotShort = (at: Date, zone: string): string =>
	DateTime.fromJSDate(at, { zone }).setLocale('en-GB').toFormat('ccc d LLL, HH:mm');
