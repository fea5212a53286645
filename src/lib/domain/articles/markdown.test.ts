import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { isSafeLink, isSameSitePath } from './links';
import { maxSourceLength } from './limits';
import { countWords } from './plain-text';
import { renderArticle } from './render-article';

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

const bare = { campaigns: [], duties: [], zone: 'UTC' };
const render = (source: string) => renderArticle(source, bare, () => '');

describe('Markdown', () => {
	it('is set with the line each block starts on', () => {
		const { html } = render(
			'# One\r\n\r\nText\r\nmore\r\n\r\n- a\r\n- b\r\n\r\n> quote\r\n\r\n```\r\ncode\r\n```\r\n\r\n| a |\r\n|---|\r\n| 1 |\r\n\r\n---\r\n'
		);
		const lines = [...html.matchAll(/<(\w+)[^>]* data-line="(\d+)"/g)].map(
			(match) => `${match[1]} ${match[2]}`
		);
		expect(lines).toEqual([
			'h2 1',
			'p 3',
			'ul 6',
			'li 6',
			'li 7',
			'blockquote 9',
			'p 9',
			'pre 11',
			'div 15',
			'hr 19'
		]);
	});
	it('tells the line of an error inside a paragraph, a list and a table', () => {
		const source =
			'One\ntwo :x{a=b}\n\n- a\n- b :x{a=b}\n\n| a |\n|---|\n| :x{a=b} |\n\n> quote\n> :x{a=b}\n';
		expect(render(source).errors.map((error) => error.line)).toEqual([2, 5, 9, 12]);
	});
	it('shows HTML as the text it is', () => {
		expect(render('a <b>c</b>\n\n<div>\n**d**\n</div>\n').html).toBe(
			'<p data-line="1">a &lt;b&gt;c&lt;/b&gt;</p><p data-line="3">&lt;div&gt;\n<strong>d</strong>\n&lt;/div&gt;</p>'
		);
	});
	it('gives headings names of their own, none above the second level', () => {
		const { headings } = render('# How it runs\n\n## How it runs\n\n### `code` & *more*\n\n#### 漢字\n');
		expect(headings).toEqual([
			{ level: 2, text: 'How it runs', id: 's-how-it-runs', line: 1 },
			{ level: 2, text: 'How it runs', id: 's-how-it-runs-2', line: 3 },
			{ level: 3, text: 'code & more', id: 's-code-and-more', line: 5 },
			{ level: 4, text: '漢字', id: 's-part', line: 7 }
		]);
	});
	it('counts words of the text alone', () => {
		const { plain, wordCount } = render('## Two words\n\nA **bold** [link](/x) – 31.2 s.\n\n- one\n- two\n');
		expect(plain).toBe('Two words\n\nA bold link – 31.2 s.\n\none\n\ntwo');
		expect(wordCount).toBe(9);
		expect(countWords('')).toBe(0);
	});
	it('reads task lists without form fields', () => {
		expect(render('- [x] done\n- [ ] open\n').html).not.toContain('<input');
	});
});

describe('links and images', () => {
	it.each([
		['https://elsewhere.example/a?b=c', true],
		['http://elsewhere.example', true],
		['mailto:desk@northlight.example', true],
		['/methods/tile-render', true],
		['#part', true],
		['javascript:alert(1)', false],
		['JaVaScRiPt:alert(1)', false],
		['java\nscript:alert(1)', false],
		['data:text/html,x', false],
		['vbscript:x', false],
		['//elsewhere.example', false],
		['/\\elsewhere.example', false],
		['\\\\elsewhere.example', false],
		['https:elsewhere', false],
		['https://', false],
		['plates/x.svg', false],
		['ftp://elsewhere.example', false],
		['', false]
	])('%j is %s', (address, safe) => {
		expect(isSafeLink(address)).toBe(safe);
	});
	it('paths of this site begin with one slash', () => {
		expect(['/a', '#a', '//a', '/\\a', 'a', '/a\u0000'].map(isSameSitePath)).toEqual([
			true,
			true,
			false,
			false,
			false,
			false
		]);
	});
	it('a link that leads nowhere safe is an error, and its words stay', () => {
		const { errors, html } = render('See [this](javascript:alert(1)).');
		expect(errors.map((error) => error.directive)).toEqual(['link']);
		expect(html).toContain('See this');
		expect(html).not.toContain('href');
	});
	it('an image needs a path of this site and a text', () => {
		expect(render('![A rig](/files/rig.png)').html).toContain(
			'<img src="/files/rig.png" alt="A rig" loading="lazy">'
		);
		expect(render('![](/files/rig.png)').errors[0]?.message).toContain('no text');
		expect(render('![A rig](https://elsewhere.example/rig.png)').errors[0]?.message).toContain(
			'from this site'
		);
		expect(render('![A rig](data:image/png;base64,AAAA)').html).not.toContain('<img');
	});
	it('a link elsewhere keeps this window to itself', () => {
		expect(render('[a](https://elsewhere.example)').html).toContain('rel="noopener external"');
	});
});

describe('what is too much', () => {
	it('refuses a source that is too long, in words', () => {
		const { errors, html } = render('a'.repeat(maxSourceLength + 1));
		expect(errors[0]).toMatchObject({ directive: 'source', line: 1 });
		expect(html).toContain('What you typed is kept.');
	});
	it.each([
		['quotes', '> '.repeat(20_000)],
		['lists', '- '.repeat(20_000)],
		['numbered lists', '1. '.repeat(20_000)],
		['both', '> - 1. '.repeat(8_000)],
		['indented lists', Array.from({ length: 600 }, (_, depth) => `${' '.repeat(depth * 2)}- a`).join('\n')]
	])('refuses %s nested without end', (_, nested) => {
		const { errors } = render(`Fine.\n\n${nested}a`);
		expect(errors[0]?.message).toContain('nested deeper');
		expect(errors[0]?.line).toBeGreaterThan(2);
	});
	it('refuses a block without end', () => {
		expect(render('a b.c-d_e@f '.repeat(4_000)).errors[0]?.message).toContain('without an empty line');
	});
	// Shapes that make a parser look back over the whole text again and again.
	it.each([
		'[',
		'![',
		'*a ',
		'*_',
		'`',
		'<',
		'&',
		'[a](',
		'a@',
		'\\*',
		'*a **b ',
		'a.b-c_',
		':a',
		':a{',
		':::a ',
		'::a{b="',
		'[a]: b',
		'| a '
	])('sets a full block of %j', (unit) => {
		const { errors } = render(unit.repeat(Math.floor(20_000 / unit.length)));
		expect(errors.filter((error) => error.directive === 'source')).toEqual([]);
	});
	it.each(['\n:::a\n', '\n::a{b=c}\n', '\na :a{b=c}\n', '\n# a\n', '- a\n', '\n> a\n', '| a |\n|---|\n\n'])(
		'sets a long text of %j',
		(unit) => {
			const { html } = render(unit.repeat(Math.floor(30_000 / unit.length)));
			expect(html.length).toBeGreaterThan(0);
		}
	);
	it('never throws, whatever is typed', () => {
		const piece = fc.oneof(
			fc.constantFrom(
				'::plate{',
				'}',
				':reading{',
				'workload=',
				'"',
				"'",
				'\n',
				'\n\n',
				'> ',
				'- ',
				':::note',
				':::',
				'```',
				'|',
				'[a](',
				')',
				'![',
				'<svg>',
				'=',
				'[',
				']',
				'{{',
				'\u0000',
				'__proto__=x',
				'\\'
			),
			fc.string({ maxLength: 8 })
		);
		fc.assert(
			fc.property(fc.array(piece, { maxLength: 40 }), (pieces) => {
				expect(typeof render(pieces.join('')).html).toBe('string');
			}),
			{ numRuns: 300 }
		);
	});
});
