import { JSDOM } from 'jsdom';
import { Marked, type Token } from 'marked';
import { describe, expect, it, vi } from 'vitest';
import spec from 'commonmark-spec';
import { decodedAddresses, markedOptions } from '../../domain/articles/markdown';
import { renderArticle } from '../../domain/articles/render-article';
import { sanitisePage } from './sanitise-page';

/*
 * Outside check: the 652 examples of the CommonMark specification 0.31.2 (John MacFarlane, CC-BY-SA 4.0), from the
 * npm package commonmark-spec.
 */
const examples = spec.tests.map(({ number, section, markdown, html }) => ({
	number,
	section,
	markdown: markdown.replaceAll('→', '\t'),
	html: html.replaceAll('→', '\t')
}));

// Real work, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000 });

const { document } = new JSDOM('').window;
const blocks = new Set(
	'p h1 h2 h3 h4 h5 h6 ul ol li blockquote pre hr div table thead tbody tr th td'.split(' ')
);
/** What only this house writes: places in the source, what scrolls, how links and pictures are fetched. */
const ours = /^(?:data-line|tabindex|rel|loading|id)$/;

/** A page as a tree in text, as a browser reads it: white space that it does not show is taken out. */
function dom(html: string): string {
	const box = document.createElement('div');
	box.innerHTML = html;
	const breaks = (node: Node | null | undefined): boolean =>
		node?.nodeType === 1 && (blocks.has((node as Element).localName) || (node as Element).localName === 'br');
	const walk = (node: Element, pre: boolean): string =>
		[...node.childNodes]
			.map((child) => {
				if (child.nodeType === 3) {
					const text = child.textContent ?? '';
					if (pre) return text;
					const atStart = child.previousSibling ? breaks(child.previousSibling) : blocks.has(node.localName);
					const atEnd = child.nextSibling ? breaks(child.nextSibling) : blocks.has(node.localName);
					let shown = text.replace(/[ \t\r\n\f]+/g, ' ');
					if (atStart) shown = shown.replace(/^ /, '');
					if (atEnd) shown = shown.replace(/ $/, '');
					return shown;
				}
				if (child.nodeType !== 1) return `<!${child.textContent ?? ''}>`;
				const one = child as Element;
				const attributes = [...one.attributes]
					.filter(({ name }) => !ours.test(name))
					.map(({ name, value }) => ` ${name}=${JSON.stringify(value)}`)
					.sort();
				return `<${one.localName}${attributes.join('')}>${walk(one, pre || one.localName === 'pre')}</>`;
			})
			.join('');
	return walk(box, false);
}

const base = new Marked(markedOptions, decodedAddresses);
const bare = { campaigns: [], duties: [], zone: 'UTC' };
const house = (markdown: string) => renderArticle(markdown, bare, () => '');

/** Examples that marked 18.2.1 sets otherwise than the specification, and why. */
const otherwise: Record<string, number[]> = {
	'a bare address is a link, as writers expect': [602, 608, 611, 612],
	'an empty line within raw HTML, which this house shows as text': [148]
};

const everyToken = (tokens: Token[], has: (token: Token) => boolean): boolean =>
	tokens.some((token) => {
		const items = 'items' in token ? (token.items as Token[]) : [];
		return has(token) || everyToken([...items, ...(('tokens' in token && token.tokens) || [])], has);
	});

const rules = {
	html: 'raw HTML is text',
	link: 'a link must lead to where a reader can go',
	image: 'a picture is of this site and says what it shows'
};

/** Which rule of this house an example falls under; null for none. */
function ruleOf(markdown: string, errors: { directive: string }[]): string | null {
	if (everyToken(base.lexer(markdown), ({ type }) => type === 'html')) return rules.html;
	const fault = errors.find(({ directive }) => directive === 'link' || directive === 'image');
	return fault ? rules[fault.directive as 'link' | 'image'] : null;
}

/** The page of an example as this house prints it: no headline but the title, no languages of code. */
const asOurs = (html: string): string =>
	dom(html.replace(/<(\/?)h1>/g, '<$1h2>').replace(/<code class="language-[^"]*">/g, '<code>'));

describe('the examples of CommonMark 0.31', () => {
	const equal = examples
		.filter(({ markdown, html }) => dom(base.parse(markdown, { async: false })) === dom(html))
		.map(({ number }) => number);

	it('are 652, of which the parser sets at least 0.99 as they stand', () => {
		expect(examples).toHaveLength(652);
		const known = Object.values(otherwise).flat();
		expect(examples.map(({ number }) => number).filter((number) => !equal.includes(number))).toEqual(
			known.sort((a, b) => a - b)
		);
		expect(equal.length / examples.length).toBeGreaterThanOrEqual(0.99);
	});

	it('come out of the house’s own page alike, but for what a named rule touches', () => {
		const set = examples.map((example) => {
			const { html, errors } = house(example.markdown);
			return { ...example, set: html, rule: ruleOf(example.markdown, errors) };
		});
		const counted: Record<string, number> = {};
		for (const { rule } of set) counted[rule ?? 'none'] = (counted[rule ?? 'none'] ?? 0) + 1;
		expect(counted).toEqual({ none: 546, [rules.html]: 72, [rules.link]: 26, [rules.image]: 8 });
		const claimed = set.filter((one) => one.rule === null && equal.includes(one.number));
		// Sanitised in one go: each call has a price of its own.
		const box = document.createElement('div');
		box.innerHTML = sanitisePage(claimed.map((one) => `<section>${one.set}</section>`).join(''));
		expect(box.children).toHaveLength(claimed.length);
		const wrong = claimed.filter(({ html }, at) => dom(box.children[at]?.innerHTML ?? '') !== asOurs(html));
		// The sanitiser trims a title of its line breaks.
		expect(wrong.map(({ number }) => number)).toEqual([196]);
	});
});
