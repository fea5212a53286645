import type { BoardChange } from '$lib/domain/bench/live-words';

/** Changes that are kept to be told. */
const mostKept = 50;
/** Until a line that the server closed for good, as while it restarts, is tried again. */
const againMs = 15_000;

/** What others do in the campaign while the page is looked at: one line to the server, none while it is hidden or left. */
export class LiveBoard {
	state = $state<'off' | 'on' | 'lost'>('off');
	changes = $state.raw<BoardChange[]>([]);
	#source: EventSource | null = null;
	#timer: ReturnType<typeof setTimeout> | undefined;
	#newest = 0;
	#ended = false;
	readonly #address: string;
	readonly #onchange: () => void;

	/**
	 * @param address of the campaign's events
	 * @param onchange called when the board should be read anew
	 */
	constructor(address: string, onchange: () => void) {
		this.#address = address;
		this.#onchange = onchange;
	}

	/** @param newest last entry of the history that the page has */
	begin(newest: number): () => void {
		this.#newest = newest;
		this.#open();
		const look = () => {
			if (document.hidden) this.#close();
			else if (!this.#source) {
				this.#open();
				this.#onchange();
			}
		};
		const leave = () => this.#close();
		document.addEventListener('visibilitychange', look);
		window.addEventListener('pagehide', leave);
		return () => {
			this.#ended = true;
			document.removeEventListener('visibilitychange', look);
			window.removeEventListener('pagehide', leave);
			this.#close();
		};
	}

	#open(): void {
		if (this.#ended || this.#source) return;
		const source = new EventSource(`${this.#address}?after=${this.#newest}`);
		this.#source = source;
		source.onopen = () => {
			// What happened while the line was lost is told, and may be more than is told one by one.
			if (this.state === 'lost') this.#onchange();
			this.state = 'on';
		};
		source.onerror = () => {
			this.state = 'lost';
			if (source.readyState !== EventSource.CLOSED) return;
			this.#close();
			this.state = 'lost';
			this.#timer = setTimeout(() => this.#open(), againMs);
		};
		source.addEventListener('change', (event: MessageEvent<string>) => this.#take(event));
	}

	#take(event: MessageEvent<string>): void {
		const fresh = JSON.parse(event.data) as BoardChange[];
		this.#newest = Math.max(this.#newest, ...fresh.map((change) => change.id));
		this.changes = [...this.changes, ...fresh].slice(-mostKept);
		this.#onchange();
	}

	#close(): void {
		clearTimeout(this.#timer);
		this.#source?.close();
		this.#source = null;
		this.state = 'off';
	}
}
