import type { MarkedExtension, Tokens } from 'marked';
import { escapeHtml } from './html';

/** `[^label]` in a sentence. */
export interface FootnoteRef extends Tokens.Generic {
	type: 'footnote-ref';
	label: string;
	html?: string;
	plain?: string;
	spoken?: string;
	line?: number;
}

/** `[^label]: text`, printed at the end of the page. */
export interface FootnoteText extends Tokens.Generic {
	type: 'footnote-text';
	label: string;
	html?: string;
	plain?: string;
	spoken?: string;
	line?: number;
}

const ref = /^\[\^([^\]\s[]{1,60})\]/;
const definition = /^ {0,3}\[\^([^\]\s[]{1,60})\]:[ \t]*/;
/** A footnote runs this many characters at most. */
const longestFootnote = 4000;

/** The length of what belongs to a definition: its lines, and after empty lines those indented by four. */
function lengthOf(source: string): number {
	let end = 0;
	let blank = false;
	for (let at = 0; at < Math.min(source.length, longestFootnote);) {
		const found = source.indexOf('\n', at);
		const stop = found < 0 ? source.length : found + 1;
		const line = source.slice(at, stop);
		if (line.trim() === '') blank = true;
		else {
			const indented = /^(?: {4}|\t)/.test(line);
			const begins =
				at > 0 && (definition.test(line) || /^(?:#{1,6} |:::?[a-z]|:::|```|~~~|>|\|)/i.test(line));
			if (!indented && (blank || begins)) break;
			blank = false;
			end = stop;
		}
		at = stop;
	}
	return end;
}

/** Where a definition interrupts the paragraph it would else belong to. */
function start(source: string): number | undefined {
	const paragraph = source.slice(0, source.search(/\n[ \t]*\n|$(?![\s\S])/));
	const at = paragraph.search(/\n {0,3}\[\^[^\]\s[]{1,60}\]:/);
	return at < 0 ? undefined : at + 1;
}

/** Marked's extension for footnotes as they are commonly written. Numbers, links and faults are settled later. */
export const footnoteSyntax = (): MarkedExtension => ({
	extensions: [
		{
			name: 'footnote-text',
			level: 'block',
			start,
			tokenizer(source) {
				const head = definition.exec(source.slice(0, 120));
				if (!head) return undefined;
				const raw = source.slice(0, lengthOf(source));
				const text = raw.slice(head[0].length).replace(/\n(?: {4}|\t)/g, '\n');
				const token: FootnoteText = {
					type: 'footnote-text',
					raw,
					label: head[1] ?? '',
					tokens: this.lexer.blockTokens(text, [])
				};
				return token;
			},
			renderer: (token) => String(token.html ?? '')
		},
		{
			name: 'footnote-ref',
			level: 'inline',
			tokenizer(source) {
				// A link cannot stand in a link.
				const match = this.lexer.state.inLink ? null : ref.exec(source.slice(0, 80));
				if (!match) return undefined;
				const token: FootnoteRef = { type: 'footnote-ref', raw: match[0], label: match[1] ?? '' };
				return token;
			},
			renderer: (token) => String(token.html ?? escapeHtml(token.raw))
		}
	]
});
