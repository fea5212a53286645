/** InnoDB’s own list of words it does not index (MariaDB Knowledge Base, “Full-Text Index Stopwords”). */
const unindexed = new Set(
	'a about an are as at be by com de en for from how i in is it la of on or that the this to was what when where who will with und the www'.split(
		' '
	)
);
/** InnoDB’s innodb_ft_min_token_size, as it comes. */
const shortest = 3;

export interface Wanted {
	/** A word that begins so, in lower case. */
	words: string[];
	/** Words that stand together, as between quotes. */
	phrases: string[];
}

const wordsIn = (text: string): string[] => text.toLowerCase().match(/[\p{L}\p{N}_]+/gu) ?? [];
const indexed = (word: string): boolean => [...word].length >= shortest && !unindexed.has(word);

/**
 * What somebody looks for: words, and phrases between double quotes. Words the index does not hold are left out.
 * @example wantedOf('"fixed clock" tile') // { words: ['tile'], phrases: ['fixed clock'] }
 */
export function wantedOf(text: string): Wanted {
	const phrases = [...text.matchAll(/["“„]([^"“”„]+)["”“]/g)]
		.map(([, inside = '']) => wordsIn(inside).join(' '))
		.filter((phrase) => phrase.split(' ').some(indexed));
	const rest = text.replace(/["“„][^"“”„]+["”“]/g, ' ');
	return { words: [...new Set(wordsIn(rest).filter(indexed))].slice(0, 12), phrases: phrases.slice(0, 4) };
}

/** The same for MariaDB’s boolean mode: every word must be there, begun as typed; null where nothing can be looked for. */
export function booleanQuery({ words, phrases }: Wanted): string | null {
	const parts = [...words.map((word) => `+${word}*`), ...phrases.map((phrase) => `+"${phrase}"`)];
	return parts.length === 0 ? null : parts.join(' ');
}

/** A piece of a text found, with what was looked for marked. */
export interface SnippetPart {
	text: string;
	hit: boolean;
}

/** Source without its marks, on one line: directives, links’ addresses and Markdown’s signs go. */
const readable = (source: string): string =>
	source
		.replace(/:{1,3}[a-z][\w-]*\{[^{}]*\}|^:{2,3}[a-z][\w-]*$/gim, '…')
		.replace(/\]\([^()\n]*\)/g, ']')
		.replace(/^\s*(?:#{1,6}|>|[-*+]|\d+[.)])\s+/gm, '')
		.replace(/[*_`[\]|]+|^:::$/gm, '')
		.replace(/\s+/g, ' ')
		.trim();

const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

/**
 * The first place of a text where something looked for stands, some words around it; null where the text holds none.
 * @param around characters on each side
 */
export function snippetOf(source: string, { words, phrases }: Wanted, around = 70): SnippetPart[] | null {
	const all = [
		...phrases.map((phrase) => phrase.split(' ').map(escaped).join('[^\\p{L}\\p{N}_]+')),
		...words.map(escaped)
	];
	if (all.length === 0) return null;
	const text = readable(source);
	const pattern = new RegExp(`(?<![\\p{L}\\p{N}_])(?:${all.join('|')})[\\p{L}\\p{N}_]*`, 'giu');
	const first = text.search(pattern);
	if (first < 0) return null;
	const from = first <= around ? 0 : text.indexOf(' ', first - around) + 1;
	const end = first + around;
	const to = end >= text.length ? text.length : Math.max(text.lastIndexOf(' ', end), first + 1);
	const cut = text.slice(from, to);
	const parts: SnippetPart[] = [];
	let at = 0;
	for (const match of cut.matchAll(pattern)) {
		if (match.index > at) parts.push({ text: cut.slice(at, match.index), hit: false });
		parts.push({ text: match[0], hit: true });
		at = match.index + match[0].length;
	}
	if (at < cut.length) parts.push({ text: cut.slice(at), hit: false });
	const head = parts[0];
	if (from > 0 && head) parts.unshift({ text: '… ', hit: false });
	if (to < text.length) parts.push({ text: ' …', hit: false });
	return parts;
}
