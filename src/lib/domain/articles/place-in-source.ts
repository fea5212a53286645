const isWord = (sign: string | undefined): boolean => sign !== undefined && /[\p{L}\p{N}]/u.test(sign);

/**
 * Where in the source of a block a place of its page stands: at the same word, the one of several that it is. 0, the
 * block's beginning, where the source has no such word, as within a number that a directive prints.
 * @param source from the block's first line on
 * @param text what the block shows
 * @param at how many characters of it stand before the place
 */
export function placeInSource(source: string, text: string, at: number): number {
	let from = at;
	let to = at;
	while (isWord(text[from - 1])) from -= 1;
	while (isWord(text[to])) to += 1;
	const word = text.slice(from, to);
	if (word === '') return 0;
	const block = source.slice(0, Math.max(0, source.search(/\n[ \t]*\n|$(?![\s\S])/)));
	const places = (within: string): number[] => {
		const found: number[] = [];
		for (let next = within.indexOf(word); next >= 0; next = within.indexOf(word, next + 1))
			if (!isWord(within[next - 1]) && !isWord(within[next + word.length])) found.push(next);
		return found;
	};
	const before = places(text).filter((one) => one < from).length;
	// Names in braces are not on the page.
	const place = places(block.replace(/\{[^{}]*\}/g, (braces) => ' '.repeat(braces.length)))[before];
	return place === undefined ? 0 : place + (at - from);
}
