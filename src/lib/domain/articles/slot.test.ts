import { describe, expect, it } from 'vitest';
import { localOf, slotFromLocal, slotShort, slotWords } from './slot';

// Clock changes of Europe/Oslo from the IANA time zone database (rule EU, tzdata `europe`):
// forward on the last Sunday of March at 01:00 UTC, back on the last Sunday of October at 01:00 UTC.
describe('a slot in the publication’s zone', () => {
	it('is stored in UTC, by the offset of that day', () => {
		expect(slotFromLocal('2026-11-14T15:00', 'Europe/Oslo')).toEqual({
			ok: true,
			at: new Date('2026-11-14T14:00:00Z')
		});
		expect(slotFromLocal('2026-07-14T15:00', 'Europe/Oslo')).toEqual({
			ok: true,
			at: new Date('2026-07-14T13:00:00Z')
		});
	});

	it('is refused where the clocks skip it, with the next time that exists', () => {
		const read = slotFromLocal('2026-03-29T02:30', 'Europe/Oslo');
		expect(read.ok).toBe(false);
		expect(!read.ok && read.message).toContain('does not exist in Europe/Oslo');
		expect(!read.ok && read.message).toContain('03:30');
	});

	it('is the first of two where the clocks go back', () => {
		expect(slotFromLocal('2026-10-25T02:30', 'Europe/Oslo')).toEqual({
			ok: true,
			at: new Date('2026-10-25T00:30:00Z')
		});
	});

	it('refuses what is no time', () => {
		for (const wrong of ['', '2026-02-30T10:00', '2026-11-14 15:00', '2026-11-14T25:00', 'tomorrow'])
			expect(slotFromLocal(wrong, 'Europe/Oslo').ok).toBe(false);
	});

	it('reads back as it was written', () => {
		const read = slotFromLocal('2026-11-14T15:00', 'Europe/Oslo');
		if (!read.ok) throw new Error(read.message);
		expect(localOf(read.at, 'Europe/Oslo')).toBe('2026-11-14T15:00');
		expect(slotWords(read.at, 'Europe/Oslo')).toBe('Saturday 14 November 2026, 15:00 (CET)');
		expect(slotShort(read.at, 'Europe/Oslo')).toBe('Sat 14 Nov, 15:00');
	});
});
