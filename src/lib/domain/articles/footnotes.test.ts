import { describe, expect, it } from 'vitest';
import { renderArticle } from './render-article';

const bare = { campaigns: [], duties: [], zone: 'UTC' };
const render = (source: string) => renderArticle(source, bare, () => '');

describe('footnotes', () => {
	it('are numbered by first use, stand at the end, and lead back to each place', () => {
		const { html, errors, plain } = render(
			'One[^b] and two[^a], again[^b].\n\n[^a]: The *second*.\n[^b]: The first,\n    on two lines.\n\n    And a paragraph.\n\nAfter.'
		);
		expect(errors).toEqual([]);
		const [body = '', notes = ''] = html.split('<section class="footnotes"');
		expect(body).toContain(
			'One<sup class="footnote-ref"><a id="fr-1" href="#fn-1" aria-label="Footnote 1">1</a></sup> and two<sup class="footnote-ref"><a id="fr-2" href="#fn-2" aria-label="Footnote 2">2</a></sup>, again<sup class="footnote-ref"><a id="fr-1-2" href="#fn-1" aria-label="Footnote 1">1</a></sup>.'
		);
		expect(body).toMatch(/After\.<\/p>$/);
		expect(
			[...notes.matchAll(/<li id="(fn-\d)" data-line="(\d+)"/g)].map((match) => [match[1], match[2]])
		).toEqual([
			['fn-1', '4'],
			['fn-2', '3']
		]);
		expect([...notes.matchAll(/href="#(fr-[\d-]+)"/g)].map((match) => match[1])).toEqual([
			'fr-1',
			'fr-1-2',
			'fr-2'
		]);
		expect(notes).toContain('The <em>second</em>.');
		expect(plain).toBe(
			'One and two, again.\n\nAfter.\n\nThe first, on two lines.\n\nAnd a paragraph.\n\nThe second.'
		);
	});

	it.each([
		['Text[^x].', 1, 'There is no footnote “x”.'],
		['Text.\n\n[^x]: Lonely.', 3, 'Nothing points to the footnote “x”.'],
		['Text[^x].\n\n[^x]: One.\n\n[^x]: Two.', 5, 'two footnotes “x”'],
		['Text[^x].\n\n[^x]: See[^x].', 3, 'cannot point to a footnote'],
		['Text[^x].\n\n[^x]: ::results', 1, ''],
		['Text[^heart].\n\n[^heat]: Warm.', 1, 'There is no footnote “heart”.']
	])('%j: what is wrong is said in its place', (source, line, words) => {
		const { errors } = render(source);
		if (words === '') return expect(errors.map(({ directive }) => directive)).toEqual(['results']);
		expect(errors[0]).toMatchObject({ line, directive: 'footnote' });
		expect(errors[0]?.message).toContain(words);
	});

	it('names the footnotes that are near', () => {
		expect(render('Text[^heart].\n\n[^heat]: Warm.').errors[0]?.nearest).toEqual(['heat']);
	});

	it('stand in tables, lists and notes, and are none in code or behind a backslash', () => {
		const { html, errors } = render(
			'- a[^1]\n\n| a |\n|---|\n| b[^2] |\n\n:::note\nc[^3]\n:::\n\n`[^4]` \\[^5]\n\n[^1]: A.\n[^2]: B.\n[^3]: C.'
		);
		expect(errors).toEqual([]);
		expect([...html.matchAll(/href="#(fn-\d)"/g)].map((match) => match[1])).toEqual(['fn-1', 'fn-2', 'fn-3']);
		expect(html).toContain('<code>[^4]</code> [^5]');
	});
});
