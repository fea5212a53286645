import { clock } from '../clock';
import { log } from '../log';

/** Something that happened to a subject, such as a campaign. */
export interface Happened {
	id: number;
	subject: number;
}

export interface HubSetup<E extends Happened> {
	/** Ids of what happened to subjects after an id of each, one query for all. */
	ids: (after: ReadonlyMap<number, number>) => Promise<Happened[]>;
	/** The events themselves. */
	events: (ids: number[]) => Promise<E[]>;
	everyMs: number;
}

interface Watcher<E> {
	subject: number;
	after: number;
	told: Set<number>;
	tell: (events: E[]) => void;
	end: () => void;
}

interface Watched {
	/** Everything up to it was seen, and nothing older can still be committed. */
	floor: number;
	/** Ids above the floor, with when each was first seen. */
	seen: Map<number, number>;
}

/**
 * A transaction takes its ids a moment before it is committed, so that a smaller id can appear after a greater one.
 * For so long the ids above the floor are looked at again.
 */
const lateMs = 10_000;

/**
 * Tells watchers what happened to their subjects, whichever process wrote it: one look at the database for all of them,
 * twice a second or as often as it is set to, and none while nobody watches.
 */
export class LiveHub<E extends Happened> {
	readonly #setup: HubSetup<E>;
	readonly #watchers = new Set<Watcher<E>>();
	readonly #watched = new Map<number, Watched>();
	#timer: NodeJS.Timeout | undefined;
	#looking: Promise<void> | null = null;
	#stopped = false;

	constructor(setup: HubSetup<E>) {
		this.#setup = setup;
	}

	get watching(): number {
		return this.#watchers.size;
	}

	/**
	 * Tells what happens to a subject after an id, until the returned function is called.
	 * @param end called when the hub itself ends
	 */
	watch(subject: number, after: number, tell: (events: E[]) => void, end: () => void): () => void {
		const watcher: Watcher<E> = { subject, after, told: new Set(), tell, end };
		if (this.#stopped) {
			end();
			return () => undefined;
		}
		this.#watchers.add(watcher);
		const known = this.#watched.get(subject);
		// Somebody whose page is older sets the floor back: what was told to others already is not told twice.
		if (known) known.floor = Math.min(known.floor, after);
		else this.#watched.set(subject, { floor: after, seen: new Map() });
		if (!this.#timer && !this.#looking) this.#again(0);
		return () => this.#leave(watcher);
	}

	#leave(watcher: Watcher<E>): void {
		this.#watchers.delete(watcher);
		if (![...this.#watchers].some((one) => one.subject === watcher.subject))
			this.#watched.delete(watcher.subject);
		if (this.#watchers.size === 0) {
			clearTimeout(this.#timer);
			this.#timer = undefined;
		}
	}

	#again(inMs: number): void {
		this.#timer = setTimeout(() => {
			this.#timer = undefined;
			this.#looking = this.look().finally(() => {
				this.#looking = null;
				if (this.#watchers.size > 0 && !this.#stopped) this.#again(this.#setup.everyMs);
			});
		}, inMs);
	}

	/** Looks once. The hub does it by itself; a test may ask. */
	async look(): Promise<void> {
		try {
			const found = await this.#setup.ids(
				new Map([...this.#watched].map(([subject, { floor }]) => [subject, floor]))
			);
			const watchers = [...this.#watchers];
			const wanted = found
				.filter((one) => watchers.some((who) => this.#isNew(who, one)))
				.map((one) => one.id);
			const events = wanted.length > 0 ? await this.#setup.events(wanted) : [];
			for (const watcher of this.#watchers) this.#tell(watcher, events);
			this.#rise(found);
		} catch (error) {
			log.warn({ error: String(error) }, 'what happens on the boards could not be read');
		}
	}

	#isNew(watcher: Watcher<E>, { id, subject }: Happened): boolean {
		return watcher.subject === subject && id > watcher.after && !watcher.told.has(id);
	}

	#tell(watcher: Watcher<E>, events: E[]): void {
		const news = events.filter((event) => this.#isNew(watcher, event));
		if (news.length === 0) return;
		for (const { id } of news) watcher.told.add(id);
		watcher.tell(news);
	}

	/** Moves each floor up to what was first seen long enough ago. */
	#rise(found: Happened[]): void {
		const now = clock.now().getTime();
		for (const { id, subject } of found) {
			const seen = this.#watched.get(subject)?.seen;
			if (seen && !seen.has(id)) seen.set(id, now);
		}
		for (const [subject, watched] of this.#watched) {
			for (const [id, at] of watched.seen)
				if (now - at >= lateMs) watched.floor = Math.max(watched.floor, id);
			for (const id of watched.seen.keys()) if (id <= watched.floor) watched.seen.delete(id);
			for (const watcher of this.#watchers)
				if (watcher.subject === subject)
					for (const id of watcher.told) if (id <= watched.floor) watcher.told.delete(id);
			for (const watcher of this.#watchers)
				if (watcher.subject === subject) watcher.after = Math.max(watcher.after, watched.floor);
		}
	}

	/** Ends every watch; nobody is taken on any more. */
	async stop(): Promise<void> {
		this.#stopped = true;
		clearTimeout(this.#timer);
		this.#timer = undefined;
		for (const watcher of [...this.#watchers]) watcher.end();
		this.#watchers.clear();
		this.#watched.clear();
		await this.#looking;
	}
}
