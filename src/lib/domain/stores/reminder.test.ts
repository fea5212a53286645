import { describe, expect, it } from 'vitest';
import { dueReminder } from './reminder';

// The calendar dates are arithmetic; the two nights on which Norway changes its clocks are from the IANA time zone
// database (Europe/Oslo: 28 March and 25 October 2027). The days themselves: common practice, no source.
describe('the reminder a loan calls for', () => {
	const at = (iso: string) => dueReminder('2026-12-12', new Date(iso), 'Europe/Oslo');

	it('is silent until a fortnight before', () => {
		expect(at('2026-11-27T22:59:00Z')).toBeNull();
		expect(at('2026-11-27T23:00:00Z')).toEqual({ kind: 'before-14', daysLeft: 14 });
	});

	it('comes three days before, on the day, and every week after', () => {
		expect(at('2026-12-08T12:00:00Z')?.kind).toBe('before-14');
		expect(at('2026-12-09T12:00:00Z')?.kind).toBe('before-3');
		expect(at('2026-12-12T12:00:00Z')).toEqual({ kind: 'due', daysLeft: 0 });
		expect(at('2026-12-18T12:00:00Z')?.kind).toBe('due');
		expect(at('2026-12-19T12:00:00Z')).toEqual({ kind: 'late-7', daysLeft: -7 });
		expect(at('2027-01-05T12:00:00Z')?.kind).toBe('late-21');
	});

	it('counts calendar days over the nights when clocks change', () => {
		expect(dueReminder('2027-03-30', new Date('2027-03-27T12:00:00Z'), 'Europe/Oslo')).toEqual({
			kind: 'before-3',
			daysLeft: 3
		});
		expect(dueReminder('2027-10-26', new Date('2027-10-23T12:00:00Z'), 'Europe/Oslo')).toEqual({
			kind: 'before-3',
			daysLeft: 3
		});
	});

	it('refuses what is no date', () => {
		expect(() => dueReminder('2026-02-30', new Date(), 'Europe/Oslo')).toThrow(RangeError);
		expect(() => dueReminder('2026-02-28', new Date(), 'Nowhere/Atlantis')).toThrow(RangeError);
	});
});
