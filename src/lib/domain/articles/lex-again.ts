import type { Token, TokensList } from 'marked';
import { isDirective } from './directive-syntax';
import { lexMarkdown, placed } from './markdown';

/** A deep copy: what is settled about an article is written into its tokens, and these here stay as they were read. */
function copyOf<T>(value: T): T {
	if (Array.isArray(value)) return value.map(copyOf) as T;
	if (typeof value !== 'object' || value === null) return value;
	const copy: Record<string, unknown> = {};
	for (const key in value) copy[key] = copyOf(value[key]);
	return copy as T;
}

/** Whether a container is not closed: what follows may still close it. */
const isOpen = (token: Token): boolean =>
	isDirective(token) && token.type === 'directive-container' && token.fault !== null;

/** Types whose last token takes in what follows, so that reading cannot begin behind them. */
const isGreedy = (token: Token | undefined): boolean =>
	token !== undefined && ['paragraph', 'text', 'footnote-text'].includes(token.type);

const lengthOf = (tokens: readonly Token[]): number =>
	tokens.reduce((length, token) => length + token.raw.length, 0);

/** How much two texts have in common at their start and, behind that, at their end. */
function shared(before: string, after: string): { start: number; end: number } {
	const most = Math.min(before.length, after.length);
	let start = 0;
	while (start < most && before.charCodeAt(start) === after.charCodeAt(start)) start += 1;
	let end = 0;
	while (
		end < most - start &&
		before.charCodeAt(before.length - 1 - end) === after.charCodeAt(after.length - 1 - end)
	)
		end += 1;
	return { start, end };
}

/** Steps over so many tokens that hold something, forwards or backwards. */
function stepped(tokens: readonly Token[], from: number, by: 1 | -1, solid: number): number {
	let at = from;
	for (let left = solid; left > 0 && tokens[at + by] !== undefined;) {
		at += by;
		if (tokens[at]?.type !== 'space') left -= 1;
	}
	return at;
}

/** Where reading may begin so that it comes to the same as from the start. */
function beginning(tokens: readonly Token[], changed: number): number {
	let at = stepped(tokens, changed, -1, 2);
	while (at > 0 && (isGreedy(tokens[at - 1]) || tokens[at]?.type === 'space')) at -= 1;
	const open = tokens.slice(0, at).findIndex(isOpen);
	return open < 0 ? at : Math.min(at, beginning(tokens, open));
}

/**
 * Reads the same article again and again as it is typed: only the blocks around a change are read anew, the others are
 * copied from before. What it gives is what `parseMarkdown` gives. Keep one for each text that is edited.
 */
export class ArticleReader {
	private source = '';
	private tokens: Token[] = [];
	/** Whether blocks are read the same wherever they stand: not where addresses are defined apart from their links. */
	private alone = false;

	/** The token tree of a source, the caller's own. RangeError where it is nested too deep. */
	readonly read = (source: string): Token[] => {
		if (source !== this.source || this.tokens.length === 0) this.take(source);
		return placed(copyOf(this.tokens));
	};

	private take(source: string): void {
		const again = this.alone ? this.around(source) : null;
		if (again) this.tokens = again;
		else {
			this.tokens = [];
			const whole = lexMarkdown(source);
			this.alone = Object.keys(whole.links).length === 0 && lengthOf(whole) === source.length;
			this.tokens = [...whole];
		}
		this.source = source;
	}

	/** The tokens of the changed text, read around the change; null where it must be read whole. */
	private around(source: string): Token[] | null {
		const { tokens } = this;
		if (source.includes('\r')) return null;
		const { start, end } = shared(this.source, source);
		const ends: number[] = [];
		let length = 0;
		for (const token of tokens) ends.push((length += token.raw.length));
		const firstChanged = ends.findIndex((one) => one >= start);
		if (firstChanged < 0) return null;
		const from = beginning(tokens, firstChanged);
		const begin = from === 0 ? 0 : (ends[from - 1] ?? 0);
		const changeEnd = this.source.length - end;
		const behind = ends.findIndex((one, at) => one - (tokens[at]?.raw.length ?? 0) >= changeEnd);
		const until = behind < 0 ? tokens.length - 1 : stepped(tokens, behind, 1, 2);
		const rest = until < tokens.length - 1;
		if (rest) {
			const windowed = lexMarkdown(
				source.slice(begin, (ends[until] ?? 0) + source.length - this.source.length)
			);
			if (this.meets(windowed, until))
				return [...tokens.slice(0, from), ...windowed, ...tokens.slice(until + 1)];
		}
		const toTheEnd = lexMarkdown(source.slice(begin));
		return this.isWhole(toTheEnd, source.length - begin) ? [...tokens.slice(0, from), ...toTheEnd] : null;
	}

	private isWhole = (read: TokensList, length: number): boolean =>
		Object.keys(read.links).length === 0 && lengthOf(read) === length;

	/** Whether what was read ends in the same block as before, so that all behind it is as it was. */
	private meets(read: TokensList, until: number): boolean {
		const last = read.at(-1);
		const before = this.tokens[until];
		return (
			Object.keys(read.links).length === 0 &&
			last?.type === before?.type &&
			last?.raw === before?.raw &&
			!isGreedy(this.tokens[until - 1]) &&
			!read.some(isOpen)
		);
	}
}
