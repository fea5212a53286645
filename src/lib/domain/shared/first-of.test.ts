import { expect, it } from 'vitest';
import { firstOf } from './first-of';

const rows = ['a', 'b', 'c', 'd'].map((slug) => ({ slug }));

it('puts the named first, in their order, and leaves out names there are none of', () => {
	expect(firstOf(rows, ['c', 'x', 'a']).map((row) => row.slug)).toEqual(['c', 'a', 'b', 'd']);
});

it('keeps rows as they are where none is named', () => {
	expect(firstOf(rows, [])).toEqual(rows);
});
