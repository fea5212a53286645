import { DateTime } from 'luxon';

/** Days between today and the due date at which a reminder goes out before it (common practice, no source). */
const before = [14, 3, 0] as const;

/** A reminder that is due; `kind` is unique for the loan and its due date, so that each goes out once. */
export interface DueReminder {
	kind: string;
	/** Days until the due date; negative when it has passed. */
	daysLeft: number;
}

/**
 * Which reminder a loan calls for today, in the publication's calendar: 14 and 3 days before, on the day,
 * then every seven days. A day on which nothing ran is made up for: the newest reminder that has come due is given.
 * @param dueOn ISO date, such as 2026-12-12
 * @param now the moment asked about
 * @param zone IANA zone of the publication
 * @returns null while the due date is more than 14 days off
 * @example dueReminder('2026-12-12', new Date('2026-12-09T08:00Z'), 'Europe/Oslo') // { kind: 'before-3', daysLeft: 3 }
 * @throws RangeError for a date or zone that does not exist
 */
export function dueReminder(dueOn: string, now: Date, zone: string): DueReminder | null {
	const due = DateTime.fromISO(dueOn, { zone });
	const today = DateTime.fromJSDate(now, { zone }).startOf('day');
	if (!due.isValid) throw new RangeError(`Not a date in a known zone: ${dueOn}, ${zone}`);
	const daysLeft = Math.round(due.startOf('day').diff(today, 'days').days);
	if (daysLeft < 0) {
		const weeks = Math.floor(-daysLeft / 7);
		return weeks === 0 ? { kind: 'due', daysLeft } : { kind: `late-${weeks * 7}`, daysLeft };
	}
	const reached = before.filter((days) => daysLeft <= days).at(-1);
	if (reached === undefined) return null;
	return { kind: reached === 0 ? 'due' : `before-${reached}`, daysLeft };
}
