import { expect, it } from 'vitest';
import { bounded } from './bounded';

it('makes a thing once, and anew when it was pushed out by others used since', () => {
	const made: string[] = [];
	const of = bounded<string, number>(2);
	const ask = (key: string) => of(key, () => made.push(key));
	expect([ask('a'), ask('b'), ask('a')]).toEqual([1, 2, 1]);
	// The third pushes out b, which was used longest ago.
	ask('c');
	expect(ask('a')).toBe(1);
	expect(ask('b')).toBe(4);
	expect(made).toEqual(['a', 'b', 'c', 'b']);
});

it('remembers that there is nothing, too', () => {
	let asked = 0;
	const of = bounded<string, undefined>(2);
	const make = () => void (asked += 1);
	of('a', make);
	of('a', make);
	expect(asked).toBe(1);
});
