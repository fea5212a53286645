import { diffArrays } from 'diff';

export interface WordCounts {
	added: number;
	removed: number;
}

/** Past so many edits the words are counted without regard to their order. */
const mostEdits = 2000;
const words = (text: string): string[] => text.match(/\S+/g) ?? [];

/** How many more of each word there are in one list than in the other: the least that can have changed. */
function unordered(before: string[], after: string[]): WordCounts {
	const balance = new Map<string, number>();
	for (const word of before) balance.set(word, (balance.get(word) ?? 0) - 1);
	for (const word of after) balance.set(word, (balance.get(word) ?? 0) + 1);
	let [added, removed] = [0, 0];
	for (const more of balance.values()) {
		if (more > 0) added += more;
		else removed -= more;
	}
	return { added, removed };
}

/**
 * How many words a text gained and lost against another. What both begin and end with is left out first, so that
 * a few words typed into a long text cost next to nothing.
 * @example wordsBetween('one two three', 'one 2 three four') // { added: 2, removed: 1 }
 */
export function wordsBetween(before: string, after: string): WordCounts {
	const [a, b] = [words(before), words(after)];
	let start = 0;
	while (start < a.length && start < b.length && a[start] === b[start]) start += 1;
	let end = 0;
	while (end < a.length - start && end < b.length - start && a.at(-1 - end) === b.at(-1 - end)) end += 1;
	const [was, is] = [a.slice(start, a.length - end), b.slice(start, b.length - end)];
	const parts = diffArrays(was, is, { maxEditLength: mostEdits });
	if (!parts) return unordered(was, is);
	return parts.reduce(
		(sum, { added, removed, count }) => ({
			added: sum.added + (added ? count : 0),
			removed: sum.removed + (removed ? count : 0)
		}),
		{ added: 0, removed: 0 }
	);
}

/** A text as its revision has it, with its title and standfirst, which count as words of it. */
export const wholeText = (one: { title: string; standfirst: string; source: string }): string =>
	`${one.title}\n${one.standfirst}\n\n${one.source}`;
