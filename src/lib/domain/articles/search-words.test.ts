import { describe, expect, it } from 'vitest';
import { booleanQuery, snippetOf, wantedOf } from './search-words';

describe('what somebody looks for', () => {
	it('is every word, begun as typed, and phrases between quotes', () => {
		const wanted = wantedOf('Tile “fixed clock” 4.95 rend');
		expect(wanted).toEqual({ words: ['tile', 'rend'], phrases: ['fixed clock'] });
		expect(booleanQuery(wanted)).toBe('+tile* +rend* +"fixed clock"');
	});

	it('leaves out what the index does not hold, and signs that would mean something to the database', () => {
		expect(booleanQuery(wantedOf('the of at is +- ~<>()"" @ *'))).toBeNull();
		expect(booleanQuery(wantedOf('+voltage -heat* @3 "a "'))).toBe('+voltage* +heat*');
	});
});

describe('the place where it was found', () => {
	const source =
		'## What a fixed clock costs\n\nHeld at 4.95 GHz the **tile render** ends in :reading{workload=tile-render profile=fixed}, see [the log](/logs/7).';

	it('is shown without marks, with what was looked for marked', () => {
		const parts = snippetOf(source, wantedOf('tile'));
		expect(parts?.filter((part) => part.hit).map((part) => part.text)).toEqual(['tile']);
		expect(parts?.map((part) => part.text).join('')).toBe(
			'What a fixed clock costs Held at 4.95 GHz the tile render ends in …, see the log.'
		);
	});

	it('marks a whole phrase, and finds nothing in a text without it', () => {
		expect(snippetOf(source, wantedOf('"fixed clock"'))?.filter((part) => part.hit)).toEqual([
			{ text: 'fixed clock', hit: true }
		]);
		expect(snippetOf(source, wantedOf('voltage'))).toBeNull();
	});

	it('is cut at words, around the first place', () => {
		const long = `${'before '.repeat(60)}voltage ${'after '.repeat(60)}`;
		const text =
			snippetOf(long, wantedOf('voltage'))
				?.map((part) => part.text)
				.join('') ?? '';
		expect(text).toMatch(/^… before .*voltage .*after …$/);
		expect(text.length).toBeLessThan(180);
	});
});
