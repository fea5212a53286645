import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isReserved, isSlug, slugOf } from './slug';

describe('slugOf', () => {
	it.each([
		['Aldermoor 1650', 'aldermoor-1650'],
		['Hollin Forge X, firmware 2.14', 'hollin-forge-x-firmware-2-14'],
		['Größe Ærø Łódź', 'grosse-aero-lodz'],
		['Crème brûlée & tea', 'creme-brulee-and-tea'],
		['2 × 16 GB', '2-x-16-gb'],
		['Tester’s choice', 'testers-choice'],
		['  -- ', ''],
		['1650', 'n1650'],
		['内存', '']
	])('%s → %s', (name, slug) => expect(slugOf(name)).toBe(slug));

	it('gives a slug or nothing, whatever is typed', () => {
		fc.assert(
			fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (text) => {
				const slug = slugOf(text);
				return slug === '' || isSlug(slug);
			})
		);
	});

	it('leaves a slug as it is', () => {
		expect(slugOf('tile-render-2')).toBe('tile-render-2');
	});

	it('cuts between words at 80 characters', () => {
		const slug = slugOf('measured word '.repeat(20));
		expect(slug.length).toBeLessThanOrEqual(80);
		expect(slug.endsWith('-')).toBe(false);
		expect(slugOf('x'.repeat(200))).toHaveLength(80);
	});
});

describe('isSlug', () => {
	it('refuses what looks like an id, capitals, and stray hyphens', () => {
		expect(['1650', 'A-b', '-a', 'a-', 'a--b', '', 'x'.repeat(81)].filter(isSlug)).toEqual([]);
	});
	it('knows the words of the application’s own addresses', () => {
		expect(isReserved('new')).toBe(true);
		expect(isReserved('stock')).toBe(false);
	});
});
