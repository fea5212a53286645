import {
	isOpen,
	isWorthKeeping,
	newSitting,
	readSittings,
	waitingOf,
	withBothKept,
	withHeld,
	withRefused,
	withStored,
	type Sitting
} from '$lib/domain/bench/sitting';
import { SvelteSet } from 'svelte/reactivity';
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
	onstored: () => void;
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
	/** Ids of stored readings that the board of the page counts already. */
	readonly #known = new SvelteSet<number>();
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

	/** Ids of what the server said it has, in all cells. */
	get storedIds(): number[] {
		return this.sittings.flatMap((sitting) => sitting.readings.flatMap((reading) => reading.id ?? []));
	}

	/** Takes note that the page's board was read after these were stored. */
	know(ids: readonly number[]): void {
		for (const id of ids) this.#known.add(id);
	}

	/** Readings of a cell that will count and that the page's board does not show yet. */
	comingTo(cell: Pick<Sitting, 'profile' | 'workload'>): number {
		return (this.find(cell)?.readings ?? []).filter(
			(reading) =>
				reading.state === 'waiting' ||
				(reading.state === 'stored' && reading.id !== undefined && !this.#known.has(reading.id))
		).length;
	}

	/** Readings of a cell's sitting that the page's board counts already. */
	ownKnown(cell: Pick<Sitting, 'profile' | 'workload'>): number {
		const readings = this.find(cell)?.readings ?? [];
		return readings.filter((reading) => reading.id !== undefined && this.#known.has(reading.id)).length;
	}

	/**
	 * Takes typed values into a cell's sitting and sends them.
	 * @param seen others' readings of the cell on the screen; null where nobody is to be asked about newer ones
	 */
	add(cell: Pick<Sitting, 'profile' | 'workload' | 'unit'>, values: number[], seen: number | null): void {
		const sitting = this.of(cell);
		sitting.firstAt ??= this.#setup.now().toISOString();
		for (const value of values) {
			sitting.readings.push({
				key: this.#setup.newKey(),
				value,
				state: 'waiting',
				...(seen === null ? {} : { seen })
			});
		}
		this.keep();
		void this.flush();
	}

	/** Keeps texts that are not readings yet for a cell. */
	draft(cell: Pick<Sitting, 'profile' | 'workload' | 'unit'>, texts: readonly string[]): void {
		if (texts.length === 0) return;
		const { drafts } = this.of(cell);
		drafts.push(...texts.map((text, at) => ({ id: String(drafts.length + at), text })));
		this.keep();
	}

	/** Sends held readings again beside the others', which their writer has now seen. */
	keepBoth(sitting: Sitting): void {
		sitting.readings = withBothKept(sitting.readings, sitting.held?.othersSeen ?? 0);
		sitting.held = null;
		this.keep();
		void this.flush();
	}

	/** Lets the others' stand alone. */
	dropHeld(sitting: Sitting): void {
		sitting.readings = sitting.readings.filter((reading) => reading.state !== 'held');
		sitting.held = null;
		this.keep();
	}

	/** Takes the last reading of a cell back while it cannot have reached the server; null where it can. */
	takeBack(cell: Pick<Sitting, 'profile' | 'workload'>): number | null {
		const sitting = this.find(cell);
		const last = sitting?.readings.at(-1);
		if (!sitting || !last || last.state !== 'waiting' || last.sent) return null;
		sitting.readings = sitting.readings.slice(0, -1);
		this.keep();
		return last.value;
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
			// Its run is another now, so that what was stored before would count as somebody else's.
			delete reading.seen;
		}
		this.keep();
		void this.flush();
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
		if (stored) this.#setup.onstored();
	}

	async #sendOne(sitting: Sitting): Promise<Sent['kind']> {
		const waiting = waitingOf(sitting);
		const keys = waiting.map((reading) => reading.key);
		for (const reading of waiting) reading.sent = true;
		sitting.changed = false;
		this.keep();
		const sent = await this.#setup.send($state.snapshot(sitting));
		if (sent.kind === 'stored') {
			const left = withStored(sitting.readings, sent.stored);
			sitting.readings = withRefused(left, keys, 'The server did not keep this reading. Send it again.');
			this.trouble = '';
		} else if (sent.kind === 'refused') {
			sitting.readings = withRefused(sitting.readings, keys, sent.message);
		} else if (sent.kind === 'held') {
			sitting.readings = withHeld(sitting.readings, keys);
			sitting.held = sent.held;
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
