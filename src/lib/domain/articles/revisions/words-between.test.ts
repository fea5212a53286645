import fc from 'fast-check';
import { expect, it } from 'vitest';
import { wordsBetween } from './words-between';

it.each([
	['one two three', 'one 2 three four', 2, 1],
	['', 'a b', 2, 0],
	['a b', '', 0, 2],
	['a a a', 'a a', 0, 1],
	['same', 'same', 0, 0],
	['spaced   out', 'spaced\nout', 0, 0]
])('from %j to %j are %d words more and %d fewer', (before, after, added, removed) => {
	expect(wordsBetween(before, after)).toEqual({ added, removed });
});

it('balances: what was there, less what went, plus what came, is what is there', () => {
	const text = fc
		.array(fc.constantFrom('a', 'b', 'c', 'fan', 'loud'), { maxLength: 40 })
		.map((list) => list.join(' '));
	const count = (words: string) => words.match(/\S+/g)?.length ?? 0;
	fc.assert(
		fc.property(text, text, (before, after) => {
			const { added, removed } = wordsBetween(before, after);
			expect(count(before) - removed + added).toBe(count(after));
		})
	);
});

it('counts two long texts that share nothing without comparing all with all', () => {
	const long = (word: string) => Array.from({ length: 60_000 }, (_, index) => `${word}${index}`).join(' ');
	expect(wordsBetween(long('a'), long('b'))).toEqual({ added: 60_000, removed: 60_000 });
});
