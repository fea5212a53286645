/**
 * Remembers what was made for a key, at most so many; the one used longest ago goes first.
 * @example const of = bounded<string, Summary>(1000); of('38.9', () => summarise([38.9]));
 */
export function bounded<K, V>(most: number): (key: K, make: () => V) => V {
	const kept = new Map<K, V>();
	return (key, make) => {
		const known = kept.has(key);
		const value = known ? (kept.get(key) as V) : make();
		if (known) kept.delete(key);
		kept.set(key, value);
		for (const oldest of kept.keys()) {
			if (kept.size <= most) break;
			kept.delete(oldest);
		}
		return value;
	};
}
