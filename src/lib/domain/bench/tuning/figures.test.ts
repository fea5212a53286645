import { expect, it } from 'vitest';
import { decimalsUpTo, short } from './figures';

it('shortens a number within a formula', () => {
	expect(short(8000 / 3)).toBe('2666.6667');
	expect(short(0.1 + 0.2)).toBe('0.3');
});

it('counts the decimals worth printing', () => {
	expect(decimalsUpTo(5200, 1)).toBe(0);
	expect(decimalsUpTo(4000 / 3, 1)).toBe(1);
	expect(decimalsUpTo(0.99996, 4)).toBe(0);
});
