import type { Token, Tokens } from 'marked';
import { isDirective } from '../directive-syntax';
import { parseMarkdown } from '../markdown';

/** Stands in a passage for a directive, a piece of code or a picture: no letter, no digit, no blank. */
export const HOLE = '\ufffc';

/** A directive inside a passage, at the index of its hole. */
export interface DirectiveAt {
	at: number;
	name: string;
	attributes: Record<string, string>;
}

/** One block of prose as it reads, each character with where it stands in the source. */
export interface Passage {
	kind: 'text' | 'heading' | 'cell';
	text: string;
	/** Offsets into the source, by index into the text: where a character begins and ends. */
	starts: number[];
	ends: number[];
	directives: DirectiveAt[];
}

const named: Record<string, string> = {
	nbsp: '\u00a0',
	thinsp: '\u2009',
	minus: '\u2212',
	plusmn: '±',
	times: '×',
	ndash: '–',
	deg: '°',
	asymp: '≈',
	amp: '&',
	frac12: '½',
	frac14: '¼'
};
const entity = /&([a-z]+\d*);/gi;

/** Line ends as the parser and the editor see them, so that offsets fit both. */
export const plainLines = (source: string): string => source.replace(/\r\n|\r/g, '\n');

/** Reads the token tree in the order of the source, with a cursor that only goes forward. */
class Reader {
	readonly passages: Passage[] = [];
	private passage: Passage | null = null;
	private cursor = 0;

	constructor(private readonly source: string) {}

	/** Where a piece stands from the cursor on: its first line is looked for, the rest goes past marks of quotes and lists. */
	private find(raw: string): number {
		const line = raw.split('\n', 1)[0] ?? '';
		return line.trim() === '' ? this.cursor : this.source.indexOf(line.trimStart(), this.cursor);
	}

	private add(text: string, start: number, end: number): void {
		if (!this.passage) return;
		this.passage.text += text;
		for (let index = 0; index < text.length; index += 1) {
			this.passage.starts.push(start);
			this.passage.ends.push(end);
		}
	}

	/** Text as it stands, line by line, since marks of a quote or an indent may stand between its lines. */
	private leaf(raw: string): void {
		raw.split('\n').forEach((line, index) => {
			if (index > 0) this.add(' ', this.cursor, this.cursor);
			// A bar in a table is escaped in the source, and no longer in the cell.
			(index > 0 ? line.trimStart() : line).split('|').forEach((piece, part) => {
				if (part > 0) this.add('|', this.cursor, this.cursor);
				this.piece(piece);
			});
		});
	}

	/** A piece of one line, its entities read. */
	private piece(text: string): void {
		const at = text === '' ? this.cursor : this.source.indexOf(text, this.cursor);
		if (at < 0) return;
		let done = 0;
		for (const match of text.matchAll(entity)) {
			const sign = named[match[1] ?? ''];
			if (sign === undefined) continue;
			this.copy(text.slice(done, match.index), at + done);
			done = match.index + match[0].length;
			this.add(sign, at + match.index, at + done);
		}
		this.copy(text.slice(done), at + done);
		this.cursor = at + text.length;
	}

	private copy(text: string, at: number): void {
		if (!this.passage) return;
		this.passage.text += text;
		for (let index = 0; index < text.length; index += 1) {
			this.passage.starts.push(at + index);
			this.passage.ends.push(at + index + 1);
		}
	}

	private hole(raw: string): void {
		const at = this.find(raw);
		if (at >= 0) this.add(HOLE, at, at + raw.length);
	}

	private inline(tokens: readonly Token[]): void {
		for (const token of tokens) {
			const start = this.find(token.raw);
			const after = start < 0 ? this.cursor : start + token.raw.length;
			const single = !token.raw.includes('\n');
			if (isDirective(token)) {
				const { name, attributes } = token;
				this.passage?.directives.push({ at: this.passage.text.length, name, attributes });
				this.hole(token.raw);
			} else if (token.type === 'codespan' || token.type === 'image' || 'autolink' in token) {
				this.hole(token.raw);
			} else if (token.type === 'br') this.add(' ', this.cursor, this.cursor);
			else if (token.type === 'escape') {
				if (start >= 0) this.add((token as Tokens.Escape).text, start, after);
			} else if ('tokens' in token && token.tokens) this.inline(token.tokens);
			else if (token.type === 'text') this.leaf(token.raw);
			if (single) this.cursor = Math.max(this.cursor, after);
		}
	}

	private block(kind: Passage['kind'], tokens: readonly Token[]): void {
		this.passage = { kind, text: '', starts: [], ends: [], directives: [] };
		this.inline(tokens);
		if (this.passage.text.trim() !== '') this.passages.push(this.passage);
		this.passage = null;
	}

	blocks(tokens: readonly Token[]): void {
		for (const token of tokens) {
			const start = this.find(token.raw);
			if (token.type === 'list') this.blocks((token as Tokens.List).items);
			else if (token.type === 'heading') this.block('heading', token.tokens ?? []);
			else if (token.type === 'paragraph' || token.type === 'text') {
				this.block('text', 'tokens' in token && token.tokens ? token.tokens : [token]);
			} else if (token.type === 'table') {
				const { header, rows } = token as Tokens.Table;
				for (const cell of [...header, ...rows.flat()]) this.block('cell', cell.tokens);
			} else if (['blockquote', 'list_item', 'directive-container'].includes(token.type)) {
				if (token.type === 'directive-container') this.cursor += token.raw.indexOf('\n');
				this.blocks('tokens' in token ? (token.tokens ?? []) : []);
			} else if (token.type === 'code' && start >= 0) this.cursor = start + token.raw.trimEnd().length;
			else if (isDirective(token) && start >= 0) this.cursor = start + token.raw.trimEnd().length;
		}
	}
}

/**
 * The prose of a source, block by block, without code, addresses, directives and pictures. RangeError where it is
 * nested too deep.
 * @param source with plain line ends
 */
export function passagesOf(source: string, tokens: readonly Token[] = parseMarkdown(source)): Passage[] {
	const reader = new Reader(source);
	reader.blocks(tokens);
	return reader.passages;
}

/** The source's piece under a stretch of a passage. */
export const placeOf = (
	{ starts, ends }: Passage,
	from: number,
	to: number
): { from: number; to: number } => ({ from: starts[from] ?? 0, to: ends[to - 1] ?? 0 });
