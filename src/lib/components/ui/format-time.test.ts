import { describe, expect, it } from 'vitest';
import { formatTime, fullTime, isoTime } from './format-time';

// Central European Time is UTC+1, and UTC+2 from the last Sunday of March to the last of October
// (Directive 2000/84/EC, articles 2 and 3: the change is at 01:00 UTC).
describe('times in the publication’s zone', () => {
	it('are said in words, winter and summer', () => {
		expect(formatTime('2026-11-14T14:00:00Z', 'Europe/Berlin', 'datetime')).toBe('14 November 2026, 15:00');
		expect(formatTime('2026-07-14T14:00:00Z', 'Europe/Berlin', 'time')).toBe('16:00');
	});
	it('change with the clock at 01:00 UTC', () => {
		expect(formatTime('2026-10-25T00:59:59Z', 'Europe/Berlin', 'time')).toBe('02:59');
		expect(formatTime('2026-10-25T01:00:00Z', 'Europe/Berlin', 'time')).toBe('02:00');
	});
	it('fall on the day of the zone', () => {
		expect(formatTime('2026-12-31T23:30:00Z', 'Europe/Oslo', 'date')).toBe('1 January 2027');
	});
	it('say their offset in full', () => {
		expect(fullTime('2026-11-14T14:00:00Z', 'Europe/Berlin')).toBe(
			'14 November 2026, 15:00:00 (Europe/Berlin, UTC+01:00)'
		);
	});
	it('take dates as well as texts, and give machines what they read', () => {
		expect(isoTime(new Date('2026-11-14T14:00:00Z'), 'Europe/Berlin')).toBe('2026-11-14T15:00:00.000+01:00');
	});
	it('count from a moment', () => {
		const now = new Date('2026-11-14T14:00:00Z');
		expect(formatTime('2026-11-14T12:00:00Z', 'UTC', 'relative', now)).toBe('2 hours ago');
	});
});

describe('a day of the calendar', () => {
	it('is the same day in every zone, and has no hour', () => {
		for (const zone of ['America/Los_Angeles', 'Europe/Oslo', 'Pacific/Auckland']) {
			expect(formatTime('2026-11-17', zone, 'date')).toBe('17 November 2026');
			expect(fullTime('2026-11-17', zone)).toBe('17 November 2026');
			expect(isoTime('2026-11-17', zone)).toBe('2026-11-17');
		}
	});
});
