import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { doubtOf, doubtWords } from './plausible';

const others = [31.1, 31.2, 31.3];

describe('a reading far from the others', () => {
	it('is asked about, with the unit that would explain it', () => {
		const doubt = doubtOf(31250, others, 's');
		expect(doubt).toMatchObject({ median: 31.2, divisor: 1000, suggested: 31.25, unit: 'ms' });
		expect(doubt && doubtWords(31250, doubt)).toBe(
			'31\u00a0250 is about 1000 times the others (31.2). Is it in ms?'
		);
	});

	it('may be too small as well', () => {
		const doubt = doubtOf(0.03125, others, 'MB/s');
		expect(doubt).toMatchObject({ suggested: 31.25, unit: 'GB/s' });
		expect(doubt && doubtWords(0.03125, doubt)).toContain('about 1/1000 of the others');
	});

	it('has no unit to name where the table has none', () => {
		const doubt = doubtOf(4_700_000, [4686, 4701], 'events/s');
		expect(doubt?.unit).toBeNull();
		expect(doubt && doubtWords(4_700_000, doubt)).toContain('Is that right?');
	});

	it('is only asked about from a hundred times on, and never without others', () => {
		expect(doubtOf(3119, others, 's')).toBeNull();
		expect(doubtOf(3120, others, 's')).not.toBeNull();
		expect(doubtOf(0.32, others, 's')).toBeNull();
		expect(doubtOf(31250, [], 's')).toBeNull();
		expect(doubtOf(0, others, 's')).toBeNull();
		expect(doubtOf(31250, [0, 0], 's')).toBeNull();
	});

	it('is never suggested to be farther away than it was', () => {
		const size = fc.double({ min: 1e-12, max: 1e15, noNaN: true });
		fc.assert(
			fc.property(size, size, (value, other) => {
				const doubt = doubtOf(value, [other], 's');
				if (!doubt) return;
				const away = (x: number) => Math.abs(Math.log10(x / other));
				expect(away(doubt.suggested)).toBeLessThanOrEqual(away(value));
				expect(doubtWords(value, doubt).length).toBeLessThan(200);
			})
		);
	});
});
