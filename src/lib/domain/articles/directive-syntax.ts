import { createDirectives } from 'marked-directive';
import type { MarkedExtension, TokenizerAndRendererExtension, Tokens } from 'marked';
import { insideOf } from './container-lines';
import { escapeHtml } from './html';

/** A directive in the token tree; `html` is filled in before the tree is printed. */
export interface DirectiveToken extends Tokens.Generic {
	type: `directive-${DirectiveToken['level']}`;
	level: 'inline' | 'block' | 'container';
	name: string;
	attributes: Record<string, string>;
	/** Why it could not be read; null where it could. */
	fault: string | null;
	html?: string;
	/** The plate it drew, once it is settled. */
	plate?: { key: string; title: string };
	/** The same in plain text, and as a narrator says it. */
	plain?: string;
	spoken?: string;
	line?: number;
}

/** A directive on a line is read from this many characters at most, so that a missing brace costs nothing. */
const longestLine = 700;

/** What counts as a directive; everything else with a colon is text. */
const written = {
	inline: /^:([a-z][\w-]*)(\{[^{}]*\})/i,
	block: /^::([a-z][\w-]*)(\{[^{}\n]*\})?[ \t]*(?:\n+|$)/i,
	container: /^:::([a-z][\w-]*)(\{[^{}\n]*\})?[ \t]*(?:\n|$)/i
};

/** Where an inline directive may start. Looked for in a window, since this is asked at every piece of text. */
function inlineStart(source: string): number | undefined {
	const near = source.slice(0, 2000);
	const at = near.includes(':') ? near.search(/:[a-z][\w-]*\{/i) : -1;
	if (at >= 0) return at;
	// Nothing starts before here, and what comes after is looked at again from here.
	return source.length > 2000 ? 2000 - longestLine : undefined;
}

/** Where a directive on its own line interrupts the paragraph it would else belong to. */
function blockStart(source: string): number | undefined {
	const paragraph = source.slice(0, source.search(/\n[ \t]*\n|$(?![\s\S])/));
	const at = paragraph.search(/\n:::?[a-z][\w-]*(?:\{[^{}\n]*\})?[ \t]*(?:\n|$)/i);
	return at < 0 ? undefined : at + 1;
}

/**
 * Quotes every bare value, because the library reads `7zip` as the number 7 and `1e3` as 1000.
 * @example quoted('{workload=7zip profile="a b"}') === '{workload="7zip" profile="a b"}'
 */
const quoted = (braces: string): string =>
	braces
		.replace(/\s+/g, ' ')
		.replace(/=\s*("[^"]*"|'[^']*'|[^\s"'{}]+)/g, (whole, value: string) =>
			/^["']/.test(value) ? `=${value}` : `="${value}"`
		);

const texts = (attributes: unknown): Record<string, string> =>
	Object.fromEntries(Object.entries(attributes ?? {}).map(([name, value]) => [name, String(value)]));

/** Wraps the library's extension of one level: our rules for what is a directive, its reading of what is inside. */
function wrapped(
	level: DirectiveToken['level'],
	inner: TokenizerAndRendererExtension
): TokenizerAndRendererExtension {
	return {
		name: `directive-${level}`,
		level: level === 'inline' ? 'inline' : 'block',
		start: level === 'inline' ? inlineStart : blockStart,
		tokenizer(source, tokens) {
			const match = written[level].exec(source.slice(0, longestLine));
			if (!match) return undefined;
			const [raw, name = '', braces = ''] = match;
			const token: DirectiveToken = {
				type: `directive-${level}`,
				level,
				raw,
				name: name.toLowerCase(),
				attributes: {},
				fault: null
			};
			try {
				const head = `${level === 'inline' ? ':' : '::'}${name}${quoted(braces)}`;
				const read = 'tokenizer' in inner ? inner.tokenizer.call(this, head, tokens) : undefined;
				token.attributes = texts(read?.attrs);
			} catch {
				token.fault =
					'What stands between the braces cannot be read. Write name=value, with quotes around a value that has spaces.';
			}
			if (level === 'container') {
				const inside = insideOf(source, raw.length);
				if ('fault' in inside) token.fault = inside.fault;
				else {
					token.raw = source.slice(0, inside.end);
					token.tokens = this.lexer.blockTokens(inside.text, []);
				}
			}
			return token;
		},
		renderer: (token) => String(token.html ?? escapeHtml(token.raw))
	};
}

/** Marked's extension for `:name{…}` in a sentence, `::name{…}` on a line, and `:::name … :::` around blocks. */
export function directiveSyntax(): MarkedExtension {
	const { extensions = [] } = createDirectives([
		{ level: 'block', marker: '::' },
		{ level: 'inline', marker: ':' }
	]);
	const [block, inline] = extensions as [TokenizerAndRendererExtension, TokenizerAndRendererExtension];
	return { extensions: [wrapped('container', block), wrapped('block', block), wrapped('inline', inline)] };
}

/** Whether a token of the tree is a directive. */
export const isDirective = (token: Tokens.Generic): token is DirectiveToken =>
	token.type.startsWith('directive-');
