import { decodeHTML } from 'entities/decode';
import type { Token, Tokens } from 'marked';

/** Which text of a directive is wanted: as it is read, or as a narrator says it. */
type Voice = 'plain' | 'spoken';

/** What a directive or a footnote left as its text; undefined for everything else. */
function left(token: Token, voice: Voice): string | undefined {
	const { plain, spoken } = token as { plain?: unknown; spoken?: unknown };
	const text = voice === 'spoken' ? (spoken ?? plain) : plain;
	return typeof text === 'string' ? text : undefined;
}

/** The text of inline tokens without their marks, entities decoded. */
export function inlineText(tokens: Token[], voice: Voice = 'plain'): string {
	return tokens
		.map((token) => {
			if (token.type === 'br') return ' ';
			if (token.type === 'image') return (token as Tokens.Image).text;
			const own = left(token, voice);
			if (own !== undefined) return own;
			if ('tokens' in token && token.tokens) return inlineText(token.tokens, voice);
			if (!('text' in token) || typeof token.text !== 'string') return '';
			return token.type === 'codespan' || token.type === 'escape' ? token.text : decodeHTML(token.text);
		})
		.join('');
}

const tidy = (text: string): string => text.replace(/[ \t\n]+/g, ' ').trim();

/** The text of a token tree without its marks: one paragraph to a block, for feeds, search and the word count. */
export function plainText(tokens: Token[], voice: Voice = 'plain'): string {
	const blocks = tokens.flatMap((token): string[] => {
		if (token.type === 'space' || token.type === 'def' || token.type === 'hr') return [];
		const own = left(token, voice);
		if (own !== undefined) return [own];
		if (token.type === 'list')
			return (token as Tokens.List).items.map((item) => plainText(item.tokens, voice));
		if (token.type === 'table') {
			const { header, rows } = token as Tokens.Table;
			return [header, ...rows].map((row) =>
				tidy(row.map((cell) => inlineText(cell.tokens, voice)).join(' '))
			);
		}
		if (token.type === 'code') return [(token as Tokens.Code).text];
		if (token.type === 'blockquote' || token.type === 'directive-container') {
			return [plainText((token as Tokens.Blockquote).tokens, voice)];
		}
		return [tidy(inlineText([token], voice))];
	});
	return blocks.filter((block) => block !== '').join('\n\n');
}

/** Words of a plain text: runs that have a letter or a digit. */
export const countWords = (text: string): number =>
	text.split(/\s+/).filter((word) => /[\p{L}\p{N}]/u.test(word)).length;
