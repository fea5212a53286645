/** Edit distance of two short words: insertions, deletions, exchanges and swaps of neighbours. */
function distance(a: string, b: string): number {
	let before: number[] = [];
	let last = Array.from({ length: b.length + 1 }, (_, j) => j);
	for (let i = 1; i <= a.length; i += 1) {
		const row = [i];
		for (let j = 1; j <= b.length; j += 1) {
			const same = a[i - 1] === b[j - 1];
			const swapped = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1];
			row[j] = Math.min(
				(last[j] ?? 0) + 1,
				(row[j - 1] ?? 0) + 1,
				(last[j - 1] ?? 0) + (same ? 0 : 1),
				swapped ? (before[j - 2] ?? 0) + 1 : Infinity
			);
		}
		before = last;
		last = row;
	}
	return last[b.length] ?? 0;
}

const plain = (name: string): string => name.trim().toLowerCase().slice(0, 120);

/**
 * The names most like the one typed, nearest first; none where nothing comes near.
 * A name that begins with or contains what was typed counts as near.
 * @example nearest('tunned', ['stock', 'tuned']) // ['tuned']
 */
export function nearest(typed: string, names: readonly string[], most = 3): string[] {
	const wanted = plain(typed);
	if (wanted === '') return [];
	const steps = (name: string): number => {
		const candidate = plain(name);
		const enough = Math.max(2, Math.ceil(Math.max(wanted.length, candidate.length) * 0.4));
		if (candidate.includes(wanted) || (candidate.length > 2 && wanted.includes(candidate))) return 1;
		if (Math.abs(candidate.length - wanted.length) > enough) return Infinity;
		const found = distance(wanted, candidate);
		return found <= enough ? found : Infinity;
	};
	return names
		.map((name) => ({ name, steps: steps(name) }))
		.filter((item) => item.steps < Infinity)
		.sort((a, b) => a.steps - b.steps)
		.slice(0, most)
		.map((item) => item.name);
}
