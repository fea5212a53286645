import { describe, expect, it } from 'vitest';
import { nearest } from './nearest';

const names = ['stock', 'all-core-tuned', 'single-core', 'huge-pages', 'no-vector-crypto'];

describe('nearest names', () => {
	it('finds what was meant', () => {
		expect(nearest('stokc', names)).toEqual(['stock']);
		expect(nearest('Single Core', names)[0]).toBe('single-core');
		expect(nearest('hugepage', names)).toEqual(['huge-pages']);
	});

	it('takes a part of a name for the name', () => {
		expect(nearest('crypto', names)).toEqual(['no-vector-crypto']);
		expect(nearest('core', names, 5)).toEqual(['all-core-tuned', 'single-core']);
	});

	it('offers nothing where nothing is near', () => {
		expect(nearest('zzzzzz', names)).toEqual([]);
		expect(nearest('  ', names)).toEqual([]);
	});

	it('does not labour over a very long word', () => {
		expect(nearest('x'.repeat(1_000_000), names)).toEqual([]);
	});
});
