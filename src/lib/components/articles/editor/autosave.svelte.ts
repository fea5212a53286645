/** What an editor saves. */
export interface Draft {
	title: string;
	standfirst: string;
	source: string;
}

/** The newest revision when it is not the one the draft was written on. */
export interface Theirs extends Draft {
	number: number;
	savedAt: string;
	savedByName: string;
	/** The revision that both began from; absent from a server that does not say. */
	base?: Draft | null;
}

/** A text as it is kept in this browser while it is not saved. */
export interface Unsaved extends Draft {
	basedOn: number;
	/** The text that was sent last and not answered: the server may have it. */
	sent?: Draft | null;
}

/** What came of a save. */
export type SaveAnswer =
	| {
			kind: 'saved';
			revision: number;
			savedAt: string;
			approvalTakenOff: boolean;
			stage: string;
			version: number;
	  }
	| { kind: 'conflict'; theirs: Theirs; message: string }
	| { kind: 'refused'; message: string }
	| { kind: 'unreachable'; message: string };

export type SaveState = 'saved' | 'typing' | 'saving' | 'failed' | 'conflict' | 'refused';

export interface AutosaveOptions {
	draft: Draft;
	revision: number;
	/** ISO time of the newest revision. */
	savedAt: string;
	send: (draft: Draft & { basedOn: number }) => Promise<SaveAnswer>;
	/** Keeps a text in this browser, or forgets it once it is saved. */
	keep: (draft: Unsaved | null) => void;
	onsaved?: (answer: Extract<SaveAnswer, { kind: 'saved' }>) => void;
	/** After the last key. */
	delayMs?: number;
	retryMs?: number;
}

const same = (a: Draft, b: Draft) =>
	a.title === b.title && a.standfirst === b.standfirst && a.source === b.source;

/** Saves a text a moment after the last key, keeps it in the browser until then, and stops at somebody else's revision. */
export class Autosave {
	state = $state<SaveState>('saved');
	revision = $state(0);
	savedAt = $state('');
	message = $state('');
	theirs = $state<Theirs | null>(null);

	private latest: Draft;
	private stored: Draft;
	private sent: Draft | null = null;
	private timer: ReturnType<typeof setTimeout> | undefined;
	private running: Promise<void> | null = null;

	constructor(private readonly options: AutosaveOptions) {
		this.latest = this.stored = options.draft;
		this.revision = options.revision;
		this.savedAt = options.savedAt;
	}

	/** Goes on from a text that this browser kept over a reload. */
	resume({ basedOn, sent, title, standfirst, source }: Unsaved): void {
		const head = { ...this.stored };
		// What was sent and never answered arrived after all.
		const arrived = sent !== undefined && sent !== null && same(sent, head);
		if (!arrived) this.revision = basedOn;
		this.sent = sent ?? null;
		this.edit({ title, standfirst, source });
	}

	/** Takes what is in the fields now and saves it once no key came for a while. */
	edit(draft: Draft): void {
		this.latest = draft;
		if (this.state === 'conflict') return this.keep();
		if (same(draft, this.stored)) {
			clearTimeout(this.timer);
			if (!this.running) this.settle();
			return;
		}
		this.keep();
		if (this.state !== 'saving') this.state = 'typing';
		this.later(this.options.delayMs ?? 1500);
	}

	/** Saves now what is not saved yet; resolves when the answer is in. */
	async saveNow(): Promise<void> {
		clearTimeout(this.timer);
		if (this.running) await this.running;
		if (this.state === 'conflict' || same(this.latest, this.stored)) return;
		this.running = this.run();
		await this.running;
		this.running = null;
		if (this.state === 'saved' && !same(this.latest, this.stored)) this.edit(this.latest);
	}

	/** Settles a conflict by their text: ours is given up. */
	takeTheirs(): Draft | null {
		if (!this.theirs) return null;
		const { number, savedAt, title, standfirst, source } = this.theirs;
		this.latest = this.stored = { title, standfirst, source };
		this.revision = number;
		this.savedAt = savedAt;
		this.theirs = null;
		this.settle();
		return this.latest;
	}

	/** Settles a conflict by ours: it becomes the next revision over theirs, which stays among the revisions. */
	async keepMine(): Promise<void> {
		if (!this.theirs) return;
		const { number, title, standfirst, source } = this.theirs;
		this.revision = number;
		this.stored = { title, standfirst, source };
		this.theirs = null;
		this.state = 'typing';
		await this.saveNow();
		if (same(this.latest, this.stored) && this.state === 'typing') this.settle();
	}

	/** Settles a conflict by a text put together of both, which becomes the next revision over theirs. */
	async takeMerged(merged: Draft): Promise<void> {
		this.latest = merged;
		await this.keepMine();
	}

	stop(): void {
		clearTimeout(this.timer);
	}

	private later(ms: number): void {
		clearTimeout(this.timer);
		this.timer = setTimeout(() => void this.saveNow(), ms);
	}

	private keep(): void {
		const sent = this.sent && !same(this.sent, this.stored) ? { sent: this.sent } : {};
		this.options.keep({ ...this.latest, basedOn: this.revision, ...sent });
	}

	private settle(): void {
		this.state = 'saved';
		this.message = '';
		this.options.keep(null);
	}

	private async run(): Promise<void> {
		const draft = this.latest;
		this.state = 'saving';
		this.message = '';
		const before = this.sent;
		this.sent = draft;
		this.keep();
		const answer = await this.options.send({ ...draft, basedOn: this.revision });
		if (answer.kind === 'conflict' && before && same(answer.theirs, before)) {
			// "Theirs" is a save of ours whose answer got lost: go on from it.
			this.revision = answer.theirs.number;
			this.stored = before;
			return this.run();
		}
		this.take(answer, draft);
	}

	private take(answer: SaveAnswer, draft: Draft): void {
		switch (answer.kind) {
			case 'saved':
				this.stored = draft;
				this.revision = answer.revision;
				this.savedAt = answer.savedAt;
				if (same(this.latest, draft)) this.settle();
				else {
					this.state = 'saved';
					this.keep();
				}
				this.options.onsaved?.(answer);
				return;
			case 'conflict':
				this.state = 'conflict';
				this.message = answer.message;
				this.theirs = answer.theirs;
				return;
			case 'refused':
				this.state = 'refused';
				this.message = answer.message;
				return;
			case 'unreachable':
				this.state = 'failed';
				this.message = answer.message;
				this.later(this.options.retryMs ?? 10_000);
		}
	}
}
