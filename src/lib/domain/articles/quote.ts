/** Where a quoted passage stands in a text now. */
export interface Standing {
	/** Offsets into the text that was given. */
	from: number;
	to: number;
	/** False where the words have changed since and the nearest passage is meant. */
	exact: boolean;
}

interface Word {
	word: string;
	from: number;
	to: number;
}

/** Words with their offsets; case, the marks around them and the kind of apostrophe do not matter. */
const wordsOf = (text: string): Word[] =>
	[...text.matchAll(/[\p{L}\p{N}](?:[^\s]*[\p{L}\p{N}%°])?/gu)].map((match) => ({
		word: match[0].toLowerCase().replace(/[’ʼ]/g, "'"),
		from: match.index,
		to: match.index + match[0].length
	}));

/** How many words of a quote stand, in order, in a window of the text (longest common subsequence). */
function inCommon(quote: string[], window: string[]): number {
	let row = new Array<number>(window.length + 1).fill(0);
	for (const word of quote) {
		const next = [0];
		for (let j = 1; j <= window.length; j++)
			next.push(word === window[j - 1] ? (row[j - 1] ?? 0) + 1 : Math.max(row[j] ?? 0, next[j - 1] ?? 0));
		row = next;
	}
	return row[window.length] ?? 0;
}

/** Most of a passage must still stand for a comment to stay on it (common practice, no source). */
const share = 0.6;
const longestQuote = 80;

/**
 * Finds a quoted passage in a text as it is now: word for word, else the window that keeps most of its words in
 * order; null where too few are left.
 * @example standingOf('the fixed clock wins', page)
 */
export function standingOf(quote: string, text: string): Standing | null {
	const wanted = wordsOf(quote)
		.map((one) => one.word)
		.slice(0, longestQuote);
	const words = wordsOf(text);
	const size = wanted.length;
	if (size === 0 || words.length === 0) return null;
	const at = (start: number, length: number, exact: boolean): Standing | null => {
		const first = words[start];
		const last = words[Math.min(start + length, words.length) - 1];
		return first && last ? { from: first.from, to: last.to, exact } : null;
	};
	for (let start = 0; start + size <= words.length; start++)
		if (wanted.every((word, index) => words[start + index]?.word === word)) return at(start, size, true);
	const known = new Set(wanted);
	let best = { start: -1, common: 0 };
	for (let start = 0; start < words.length; start++) {
		// A window that does not begin with one of its words is no better than the next one.
		if (!known.has(words[start]?.word ?? '')) continue;
		const window = words.slice(start, start + size + 2).map((one) => one.word);
		const common = inCommon(wanted, window);
		if (common > best.common) best = { start, common };
	}
	if (best.common < size * share || best.start < 0) return null;
	// The window may reach past the passage: it ends where no more of the quote would be lost.
	const window = words.slice(best.start, best.start + size + 2).map((one) => one.word);
	while (inCommon(wanted, window.slice(0, -1)) === best.common) window.pop();
	return at(best.start, window.length, false);
}
