/** Somebody else who has the article open to edit it. */
export interface Present {
	name: string;
	/** Seconds since their last key; null while they only look. */
	lastKeyAgoS: number | null;
}

export interface PresenceOptions {
	/** Tells the server that we are here, and answers who else is; null when nothing answered. */
	tell: (said: { lastKeyAgoS: number | null; leaving: boolean }) => Promise<Present[] | null>;
	everyMs?: number;
	now?: () => number;
}

/** Says that this page is open, a few times a minute while it is looked at, and learns who else has it open. */
export class Presence {
	others = $state.raw<Present[]>([]);
	#lastKey: number | null = null;
	#timer: ReturnType<typeof setTimeout> | undefined;
	#open = false;
	readonly #options: Required<PresenceOptions>;

	constructor(options: PresenceOptions) {
		this.#options = { everyMs: 15_000, now: () => performance.now(), ...options };
	}

	/** A key was pressed in the text. */
	keyed(): void {
		this.#lastKey = this.#options.now();
	}

	begin(): void {
		if (this.#open) return;
		this.#open = true;
		void this.#round();
	}

	/** The page is left, or looked away from. */
	end(): void {
		if (!this.#open) return;
		this.#open = false;
		clearTimeout(this.#timer);
		this.others = [];
		void this.#options.tell({ lastKeyAgoS: this.#agoS(), leaving: true });
	}

	#agoS(): number | null {
		return this.#lastKey === null ? null : Math.round((this.#options.now() - this.#lastKey) / 1000);
	}

	async #round(): Promise<void> {
		const others = await this.#options.tell({ lastKeyAgoS: this.#agoS(), leaving: false });
		if (!this.#open) return;
		// Nobody is said to be there by a server that does not answer.
		this.others = others ?? [];
		this.#timer = setTimeout(() => void this.#round(), this.#options.everyMs);
	}
}
