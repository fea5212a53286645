import type { Token, Tokens } from 'marked';

const decoded: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', '#39': "'", nbsp: '\u00a0' };
const decode = (text: string): string =>
	text.replace(/&(amp|lt|gt|quot|#39|nbsp);/g, (_, name: string) => decoded[name] ?? '');

function inline(tokens: Token[]): string {
	return tokens
		.map((token) => {
			if (token.type === 'br') return ' ';
			if (token.type === 'image') return (token as Tokens.Image).text;
			if ('plain' in token && typeof token.plain === 'string') return token.plain;
			if ('tokens' in token && token.tokens) return inline(token.tokens);
			return 'text' in token && typeof token.text === 'string' ? decode(token.text) : '';
		})
		.join('');
}

const tidy = (text: string): string => text.replace(/[ \t\n]+/g, ' ').trim();

/** The text of a token tree without its marks: one paragraph to a block, for feeds, search and the word count. */
export function plainText(tokens: Token[]): string {
	const blocks = tokens.flatMap((token): string[] => {
		if (token.type === 'space' || token.type === 'def' || token.type === 'hr') return [];
		if ('plain' in token && typeof token.plain === 'string') return [token.plain];
		if (token.type === 'list') return (token as Tokens.List).items.map((item) => plainText(item.tokens));
		if (token.type === 'table') {
			const { header, rows } = token as Tokens.Table;
			return [header, ...rows].map((row) => tidy(row.map((cell) => inline(cell.tokens)).join(' ')));
		}
		if (token.type === 'code') return [(token as Tokens.Code).text];
		if (token.type === 'blockquote' || token.type === 'directive-container') {
			return [plainText((token as Tokens.Blockquote).tokens)];
		}
		return [tidy(inline([token]))];
	});
	return blocks.filter((block) => block !== '').join('\n\n');
}

/** Words of a plain text: runs that have a letter or a digit. */
export const countWords = (text: string): number =>
	text.split(/\s+/).filter((word) => /[\p{L}\p{N}]/u.test(word)).length;
