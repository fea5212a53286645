import { describe, expect, it } from 'vitest';
import { holding, holds } from './embargo';

const until = new Date('2026-11-13T13:00:00Z');
const before = new Date(until.getTime() - 1);

describe('an embargo', () => {
	it('holds to the last millisecond before its end, and not at its end', () => {
		const embargo = { field: 'results' as const, until, liftedAt: null };
		expect(holds(embargo, before)).toBe(true);
		expect(holds(embargo, until)).toBe(false);
	});

	it('ends when it is lifted', () => {
		expect(holds({ field: 'results', until, liftedAt: before }, before)).toBe(false);
	});

	it('on everything covers each field, and the longest is named first', () => {
		const later = new Date('2026-12-01T00:00:00Z');
		const all = [
			{ field: 'specification' as const, until, liftedAt: null },
			{ field: 'everything' as const, until: later, liftedAt: null }
		];
		expect(holding(all, before).map((e) => e.field)).toEqual(['everything', 'specification']);
		expect(holding(all, before, 'results').map((e) => e.field)).toEqual(['everything']);
	});
});
