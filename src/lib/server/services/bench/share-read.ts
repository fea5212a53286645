interface Waiting<T> {
	promise: Promise<T>;
	resolve: (value: T) => void;
	reject: (reason: unknown) => void;
	read: () => Promise<T>;
}

interface Line<T> {
	running: boolean;
	timer: NodeJS.Timeout | undefined;
	/** What those get who came since the running one began; not begun yet. */
	next: Waiting<T> | null;
}

function waitingFor<T>(read: () => Promise<T>): Waiting<T> {
	let settle: Pick<Waiting<T>, 'resolve' | 'reject'> | undefined;
	const promise = new Promise<T>((resolve, reject) => (settle = { resolve, reject }));
	return {
		promise,
		read,
		resolve: (value) => settle?.resolve(value),
		reject: (reason) => settle?.reject(reason)
	};
}

/**
 * Lets those who read the same at about the same time share a reading, one after another: who comes while one runs gets
 * the next, so that nobody is given what was read before they asked. A board that ten people watch is then worked out
 * once for each change, not ten times.
 */
export function sharedReads<T>() {
	const lines = new Map<number, Line<T>>();

	function begin(key: number, line: Line<T>): void {
		clearTimeout(line.timer);
		line.timer = undefined;
		const { next } = line;
		if (line.running || !next) return;
		line.next = null;
		line.running = true;
		const end = () => {
			line.running = false;
			if (line.next) begin(key, line);
			else lines.delete(key);
		};
		next.read().then(next.resolve, next.reject).finally(end);
	}

	/**
	 * @param gatherMs how long to wait for others before a reading begins; without it one that waits begins at once
	 */
	return (key: number, read: () => Promise<T>, gatherMs = 0): Promise<T> => {
		const line = lines.get(key) ?? { running: false, timer: undefined, next: null };
		lines.set(key, line);
		const { promise } = (line.next ??= waitingFor(read));
		if (gatherMs === 0) begin(key, line);
		else if (!line.running) line.timer ??= setTimeout(() => begin(key, line), gatherMs);
		return promise;
	};
}
