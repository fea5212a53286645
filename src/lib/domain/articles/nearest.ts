/** Letters to change, add or take away to get from one text to the other (Levenshtein distance). */
export function editDistance(from: string, to: string): number {
	let row = Array.from({ length: to.length + 1 }, (_, index) => index);
	for (let i = 1; i <= from.length; i++) {
		const next = [i];
		for (let j = 1; j <= to.length; j++) {
			const swap = (row[j - 1] ?? 0) + (from[i - 1] === to[j - 1] ? 0 : 1);
			next.push(Math.min(swap, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
		}
		row = next;
	}
	return row[to.length] ?? 0;
}

/**
 * The known names closest to a mistyped one, nearest first; names that contain it or are contained in it count as near.
 * @example nearest('tile-rendr', ['tile-render', 'prime-sieve']) // ['tile-render', 'prime-sieve']
 */
export function nearest(typed: string, known: readonly string[], most = 3): string[] {
	// A text far longer than any name is a paste, and its distance would only cost time.
	const wanted = typed.toLowerCase().slice(0, 120);
	const far = (name: string) =>
		wanted !== '' && (name.includes(wanted) || wanted.includes(name)) ? 1 : editDistance(wanted, name);
	return [...new Set(known)]
		.map((name) => ({ name, distance: far(name.toLowerCase()) }))
		.sort((a, b) => a.distance - b.distance || a.name.localeCompare(b.name, 'en'))
		.slice(0, most)
		.map(({ name }) => name);
}
