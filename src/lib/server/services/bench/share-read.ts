interface Reads<T> {
	running: Promise<T>;
	/** Begins when the running one has ended, for all who came meanwhile. */
	next: Promise<T> | null;
}

/**
 * Lets those who read the same at once share a reading: who comes while one runs gets the next, so that nobody is given
 * what was read before they asked. A board that ten people watch is then worked out once for each change, not ten times.
 */
export function sharedReads<T>() {
	const reads = new Map<number, Reads<T>>();
	return (key: number, read: () => Promise<T>): Promise<T> => {
		const begin = (): Promise<T> => {
			const running = read();
			const own: Reads<T> = { running, next: null };
			reads.set(key, own);
			const end = () => {
				if (own.next === null && reads.get(key) === own) reads.delete(key);
			};
			running.then(end, end);
			return running;
		};
		const now = reads.get(key);
		if (!now) return begin();
		return (now.next ??= now.running.then(begin, begin));
	};
}
