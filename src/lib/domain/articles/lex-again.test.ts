import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measuredArticle } from '../../../../tests/fixtures/article-data';
import { ArticleReader } from './lex-again';
import { parseMarkdown } from './markdown';
import { renderArticle } from './render-article';

const data = measuredArticle();
const svg = () => '<svg></svg>';

/** Pieces that begin, end, hold or take in blocks, so that an edit anywhere may change what is around it. */
const piece = fc.constantFrom(
	...[
		'\n',
		'\n\n',
		'\n\n',
		' ',
		'    ',
		'\t',
		'word',
		'a *b* c',
		'**',
		'`',
		'# Head\n',
		'## Head',
		'\n---\n',
		'===\n'
	],
	...[
		'- item',
		'\n- item\n',
		'  - deeper\n',
		'1. one\n',
		'> quote',
		'>',
		'```\n',
		'```',
		'~~~\n',
		'    code\n'
	],
	...[
		'| a | b |\n',
		'| --- | --- |\n',
		'| 1 | 2 |\n',
		'|',
		'[x](/y)',
		'[x]',
		'[x]: /y\n',
		'![](/a.png)',
		'<b>'
	],
	...[
		':::note\n',
		':::note{title="T"}\n',
		':::\n',
		'\n:::\n',
		'::results\n',
		'::plate{kind=gains}\n',
		'::steps\n'
	],
	...[
		':reading{workload=source-build profile=stock}',
		':gain{',
		'}',
		'{',
		':',
		'&amp;',
		'&amp;amp;',
		'\\',
		'\r\n'
	],
	...['[^a]', '[^a]: note\n', '::contents\n', ':::step\n', '\n    more\n']
);
const text = fc.array(piece, { maxLength: 30 }).map((pieces) => pieces.join(''));
const edits = fc.array(
	fc.record({ at: fc.double({ min: 0, max: 1, noNaN: true }), cut: fc.nat(12), put: text }),
	{ minLength: 1, maxLength: 8 }
);

/** The source after each of several edits, the first included. */
function stages(first: string, changes: { at: number; cut: number; put: string }[]): string[] {
	let source = first;
	return [
		first,
		...changes.map(({ at, cut, put }) => {
			const from = Math.floor(at * source.length);
			return (source = source.slice(0, from) + put + source.slice(from + cut));
		})
	];
}

/** As text, because comparing trees token by token takes longer than reading them. */
const tree = (tokens: unknown[]): string => JSON.stringify([...tokens], null, 1);

describe('an article read again as it is typed', () => {
	it('is the article read whole, after any edits', () => {
		fc.assert(
			fc.property(text, edits, (first, changes) => {
				const { read } = new ArticleReader();
				for (const source of stages(first, changes))
					expect(tree(read(source))).toBe(tree(parseMarkdown(source)));
			}),
			{ numRuns: 120 }
		);
	});

	it('comes to the same page, whatever was settled in the tokens before', () => {
		fc.assert(
			fc.property(text, edits, (first, changes) => {
				const { read } = new ArticleReader();
				for (const source of stages(first, changes))
					expect(JSON.stringify(renderArticle(source, data, svg, { read }))).toBe(
						JSON.stringify(renderArticle(source, data, svg))
					);
			}),
			{ numRuns: 40 }
		);
	});

	it('reads only around a change', () => {
		const block = (n: number) => `Paragraph ${n} with *some* words.`;
		const before = Array.from({ length: 200 }, (_, n) => block(n));
		const reader = new ArticleReader();
		reader.read(before.join('\n\n'));
		const kept = Reflect.get(reader, 'tokens') as unknown[];
		reader.read(before.with(100, 'Another one.').join('\n\n'));
		const now = new Set(Reflect.get(reader, 'tokens') as unknown[]);
		expect(kept.filter((token) => !now.has(token)).length).toBeLessThan(15);
	});

	it('sees a line far below close a container', () => {
		const { read } = new ArticleReader();
		const long = Array.from({ length: 20 }, (_, n) => `Paragraph ${n}.`).join('\n\n');
		const open = `:::note\n\n${long}\n\nlast`;
		read(open);
		const closed = `${open}\n:::\n`;
		expect(tree(read(closed))).toBe(tree(parseMarkdown(closed)));
		expect(tree(read(open))).toBe(tree(parseMarkdown(open)));
	});
});

describe('the blocks of a page', () => {
	it('are the page', () => {
		fc.assert(
			fc.property(text, (source) => {
				const { html, blocks } = renderArticle(source, data, svg);
				expect(blocks.map((block) => block.html).join('')).toBe(html);
			})
		);
	});
});
