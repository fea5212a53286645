import { decodeHTML } from 'entities/decode';
import { Marked, type MarkedExtension, type Token, type Tokens, type TokensList } from 'marked';
import { directiveSyntax, isDirective } from './directive-syntax';
import { footnoteSyntax } from './footnote-syntax';
import { element, escapeHtml } from './html';
import { isSafeLink, relOf } from './links';
import { inlineText } from './plain-text';

/** A token with the line it starts on, from 1, and what was settled about it before printing. */
export type Placed = Token & { line?: number; id?: string; refused?: string; printed?: string };

const at = (token: object): number | undefined => (token as { line?: number }).line;

/** How marked is set up before any rule of this house: CommonMark with tables, and bare addresses are links. */
export const markedOptions = { gfm: true, breaks: false };

/** Marked leaves entities in addresses and titles as they were typed; CommonMark decodes them. */
export const decodedAddresses: MarkedExtension = {
	walkTokens(token) {
		if (token.type !== 'link' && token.type !== 'image') return;
		const link = token as Tokens.Link | Tokens.Image;
		link.href = decodeHTML(link.href);
		if (link.title) link.title = decodeHTML(link.title);
	}
};

/** An address as it stands in an attribute: percent-encoded where CommonMark's examples are, and not twice. */
function encoded(href: string): string {
	try {
		return encodeURI(href).replace(/%25/g, '%');
	} catch {
		// Half a surrogate pair: no address has one.
		return href.toWellFormed();
	}
}

/**
 * CommonMark with tables and our directives; HTML in a source is text. The renderers print what was settled
 * in the token tree beforehand and keep no state, so that one parser serves everybody.
 */
const marked = new Marked(markedOptions);
marked.use(directiveSyntax(), footnoteSyntax());
marked.use({
	tokenizer: {
		// No token, and not marked's own reading either: what looks like HTML stays text and is escaped.
		html: () => undefined,
		tag: () => undefined
	},
	renderer: {
		heading(token) {
			// The page's title is its one h1.
			const tag = `h${Math.max(2, token.depth)}`;
			const { id } = token as { id?: string };
			return element(tag, { id, 'data-line': at(token) }, this.parser.parseInline(token.tokens));
		},
		paragraph(token) {
			// A picture alone in its paragraph is a figure, which must not stand in one.
			const { printed } = token as Placed;
			if (printed !== undefined) return printed;
			return element('p', { 'data-line': at(token) }, this.parser.parseInline(token.tokens));
		},
		blockquote(token) {
			return element('blockquote', { 'data-line': at(token) }, this.parser.parse(token.tokens));
		},
		hr(token) {
			return `<hr data-line="${at(token) ?? ''}">`;
		},
		code(token) {
			const text = token.text.replace(/\n$/, '');
			return element(
				'pre',
				{ 'data-line': at(token), tabindex: 0 },
				`<code>${text === '' ? '' : `${escapeHtml(text)}\n`}</code>`
			);
		},
		list(token) {
			const start = token.ordered && token.start !== 1 && token.start !== '' ? token.start : undefined;
			return element(
				token.ordered ? 'ol' : 'ul',
				{ 'data-line': at(token), start },
				token.items.map((item) => this.listitem(item)).join('')
			);
		},
		listitem(token) {
			return element('li', { 'data-line': at(token) }, this.parser.parse(token.tokens));
		},
		checkbox: ({ checked }) => (checked ? '☑ ' : '☐ '),
		table(token) {
			const cell = (one: Tokens.TableCell, tag: 'th' | 'td') =>
				element(
					tag,
					{
						class: one.align === 'right' ? 'num' : undefined,
						scope: tag === 'th' ? 'col' : undefined
					},
					this.parser.parseInline(one.tokens)
				);
			const row = (cells: Tokens.TableCell[], tag: 'th' | 'td') =>
				`<tr>${cells.map((one) => cell(one, tag)).join('')}</tr>`;
			return element(
				'div',
				{ class: 'table-box', tabindex: 0, role: 'group', 'aria-label': 'Table', 'data-line': at(token) },
				`<table><thead>${row(token.header, 'th')}</thead><tbody>${token.rows.map((one) => row(one, 'td')).join('')}</tbody></table>`
			);
		},
		codespan: (token) => element('code', {}, escapeHtml(token.text)),
		link(token) {
			const inner = this.parser.parseInline(token.tokens);
			if (!isSafeLink(token.href)) return inner + ((token as Placed).refused ?? '');
			return element(
				'a',
				{ href: encoded(token.href), title: token.title ?? undefined, rel: relOf(token.href) },
				inner
			);
		},
		image(token) {
			const { refused, printed } = token as Placed;
			const settled = refused ?? printed;
			if (settled !== undefined) return settled;
			const title = token.title ? ` title="${escapeHtml(token.title)}"` : '';
			return `<img src="${escapeHtml(encoded(token.href))}" alt="${escapeHtml(token.text)}"${title} loading="lazy">`;
		},
		text(token) {
			if ('tokens' in token && token.tokens) return this.parser.parseInline(token.tokens);
			// Entities that a writer typed are decoded by the browser, so they stay as they are.
			return token.text
				.replace(/&(?!(?:#\d{1,7}|#x[\da-f]{1,6}|\w+);)/gi, '&amp;')
				.replace(/[<>"']/g, (sign) => escapeHtml(sign));
		}
	}
});

const linesIn = (raw: string): number => raw.split('\n').length - 1;

/** The lists of tokens inside a token, with the lines they begin after it. */
function inside(token: Token): { tokens: Token[]; offset: number }[] {
	if (token.type === 'list') return [{ tokens: (token as Tokens.List).items, offset: 0 }];
	if (token.type === 'table') {
		const { header, rows } = token as Tokens.Table;
		return [
			...header.map((cell) => ({ tokens: cell.tokens, offset: 0 })),
			...rows.flatMap((row, index) => row.map((cell) => ({ tokens: cell.tokens, offset: index + 2 })))
		];
	}
	const tokens = 'tokens' in token ? token.tokens : undefined;
	const container = isDirective(token as Tokens.Generic) && token.type === 'directive-container';
	return tokens ? [{ tokens, offset: container ? 1 : 0 }] : [];
}

/** The tokens that stand directly in one. */
export const childrenOf = (token: Token): Token[] => inside(token).flatMap((list) => list.tokens);

function place(tokens: Token[], first: number): void {
	let line = first;
	for (const token of tokens) {
		(token as Placed).line = line;
		void decodedAddresses.walkTokens?.(token);
		for (const { tokens: inner, offset } of inside(token)) place(inner, line + offset);
		// What is said for a picture is its text without marks.
		if (token.type === 'image' && token.tokens) token.text = inlineText(token.tokens);
		line += linesIn(token.raw);
	}
}

/** The token tree of a source as it is read, nothing settled yet. RangeError where it is nested too deep. */
export const lexMarkdown = (source: string): TokensList => marked.lexer(source);

/** A tree as it was read, each token now with the line it starts on. */
export function placed(tokens: Token[]): Token[] {
	place(tokens, 1);
	return tokens;
}

/** The token tree of a source, each token with the line it starts on. RangeError where it is nested too deep. */
export const parseMarkdown = (source: string): Token[] => placed(lexMarkdown(source));

/** Calls for every token of a tree, outermost first. */
export function eachToken(tokens: Token[], visit: (token: Placed) => void): void {
	for (const token of tokens) {
		visit(token);
		for (const { tokens: inner } of inside(token)) eachToken(inner, visit);
	}
}

/** The markup of a token tree. */
export const printMarkdown = (tokens: Token[]): string => marked.parser(tokens);
