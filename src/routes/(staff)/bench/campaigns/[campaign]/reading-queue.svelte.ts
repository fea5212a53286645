import {
	isOpen,
	isWorthKeeping,
	newSitting,
	readSittings,
	waitingOf,
	withRefused,
	withStored,
	type Sitting
} from '$lib/domain/bench/sitting';
import type { Sent } from './send-readings';

/** Where the queue keeps what is not on record yet: the browser's storage, of which it needs these. */
export type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;

interface Setup {
	/** One per person and campaign. */
	storageKey: string;
	store: Store | null;
	newKey: () => string;
	send: (sitting: Sitting) => Promise<Sent>;
	/** Called when readings reached the server, so that the page can read them anew. */
	onstored: () => Promise<void>;
	now: () => Date;
}

/** Milliseconds until a sending that found no server is tried again. */
export const retryMs = 10_000;

/**
 * Readings on their way from the grid to the server. They are sent one sitting at a time, in the order typed; while the
 * server cannot be reached they wait, also over a reload; what it refuses stays, with the reason, until it is dropped.
 */
export class ReadingQueue {
	sittings = $state<Sitting[]>([]);
	/** Why nothing gets through at present; empty while it does. */
	trouble = $state('');
	/** False where the browser keeps nothing: then a reload would lose what waits. */
	keeps = $state(true);
	#sending = false;
	#timer: ReturnType<typeof setTimeout> | undefined;
	readonly #setup: Setup;

	constructor(setup: Setup) {
		this.#setup = setup;
	}

	/** Readings that are not on record yet, in all cells. */
	get waiting(): number {
		return this.sittings.reduce((sum, sitting) => sum + waitingOf(sitting).length, 0);
	}

	restore(): void {
		const { store, storageKey } = this.#setup;
		this.sittings = readSittings(store?.getItem(storageKey) ?? null);
	}

	/** The sitting of a cell, begun if there is none. */
	of(cell: Pick<Sitting, 'profile' | 'workload' | 'unit'>): Sitting {
		return this.find(cell) ?? this.#begin(cell);
	}

	find(cell: Pick<Sitting, 'profile' | 'workload'>): Sitting | undefined {
		return this.sittings.find((one) => one.profile === cell.profile && one.workload === cell.workload);
	}

	#begin(cell: Pick<Sitting, 'profile' | 'workload' | 'unit'>): Sitting {
		const { profile, workload, unit } = cell;
		this.sittings.push(newSitting({ profile, workload, unit }, this.#setup.newKey));
		return this.of(cell);
	}

	/** Takes typed values into a cell's sitting and sends them. */
	add(cell: Pick<Sitting, 'profile' | 'workload' | 'unit'>, values: number[]): void {
		const sitting = this.of(cell);
		sitting.firstAt ??= this.#setup.now().toISOString();
		for (const value of values) {
			sitting.readings.push({ key: this.#setup.newKey(), value, state: 'waiting' });
		}
		this.keep();
		void this.flush();
	}

	/** Throws a refused reading away. */
	drop(sitting: Sitting, key: string): void {
		sitting.readings = sitting.readings.filter((reading) => reading.key !== key);
		this.keep();
	}

	/** Sends refused readings of a sitting again, as a run of their own: the old one may be what was refused. */
	again(sitting: Sitting): void {
		const refused = sitting.readings.filter((reading) => reading.state === 'refused');
		sitting.runKey = this.#setup.newKey();
		for (const reading of refused) {
			reading.state = 'waiting';
			delete reading.message;
		}
		this.keep();
		void this.flush();
	}

	/** Forgets what the page now shows from the record. */
	settle(ids: ReadonlySet<number>): void {
		for (const sitting of this.sittings) {
			const left = sitting.readings.filter((one) => one.id === undefined || !ids.has(one.id));
			if (left.length < sitting.readings.length) sitting.readings = left;
		}
	}

	keep(): void {
		const { store, storageKey } = this.#setup;
		const worth = this.sittings.filter(isWorthKeeping);
		try {
			if (worth.length > 0) store?.setItem(storageKey, JSON.stringify(worth));
			else store?.removeItem(storageKey);
			this.keeps = store !== null;
		} catch {
			this.keeps = false;
		}
	}

	/** Sends what waits, until nothing does or the server cannot be reached. */
	async flush(): Promise<void> {
		if (this.#sending) return;
		this.#sending = true;
		clearTimeout(this.#timer);
		let stored = false;
		try {
			for (let next = this.sittings.find(isOpen); next; next = this.sittings.find(isOpen)) {
				const outcome = await this.#sendOne(next);
				stored ||= outcome === 'stored';
				if (outcome === 'unreached') break;
			}
		} finally {
			this.#sending = false;
		}
		if (stored) await this.#setup.onstored();
	}

	async #sendOne(sitting: Sitting): Promise<Sent['kind']> {
		const keys = waitingOf(sitting).map((reading) => reading.key);
		sitting.changed = false;
		const sent = await this.#setup.send($state.snapshot(sitting));
		if (sent.kind === 'stored') {
			const left = withStored(sitting.readings, sent.stored);
			sitting.readings = withRefused(left, keys, 'The server did not keep this reading. Send it again.');
			this.trouble = '';
		} else if (sent.kind === 'refused') {
			sitting.readings = withRefused(sitting.readings, keys, sent.message);
		} else {
			sitting.changed = true;
			this.trouble = sent.message;
			this.#timer = setTimeout(() => void this.flush(), retryMs);
		}
		this.keep();
		return sent.kind;
	}

	/** Ends what would go on by itself. */
	stop(): void {
		clearTimeout(this.#timer);
	}
}
