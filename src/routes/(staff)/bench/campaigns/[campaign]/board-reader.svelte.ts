import { goto, preloadData } from '$app/navigation';
import { navigating } from '$app/state';
import { withNews, type WiredNews } from '$lib/domain/bench/board-news';
import type { PageData } from './$types';

interface Cell {
	profile: string;
	workload: string;
}

interface Setup {
	/** What the page was given last. */
	given: () => PageData;
	/** Address of the page with a cell opened. */
	href: (cell: Cell) => string;
	/** What changed on the board of that tag, for somebody who looks at that cell; null where it is not to be had. */
	news: (tag: string, cell: Cell) => Promise<WiredNews | null>;
	/** Ids of readings that are stored; the board counts them once it was read after they were. */
	storedIds: () => number[];
	onread: (ids: number[]) => void;
}

/** What happens within so many milliseconds is read together. */
const gatherMs = 250;
/** A board that takes long to read is read less often: it rests for so many times as long as it took. */
const restTimes = 4;

/**
 * Reads the board anew, and opens other cells of it, without ever leaving the page: an entry can go on at once in the
 * cell gone to, and a server that cannot be reached costs nothing but newer figures.
 */
export class BoardReader {
	/** The cell gone to, until the page has it. */
	wanted = $state.raw<Cell | null>(null);
	#fresh = $state.raw<{ over: PageData; data: PageData } | null>(null);
	#line: Promise<void> = Promise.resolve();
	#timer: ReturnType<typeof setTimeout> | undefined;
	#count = 0;
	#tookMs = 0;
	readonly #setup: Setup;

	constructor(setup: Setup) {
		this.#setup = setup;
	}

	/** The newest the page has. */
	get data(): PageData {
		const given = this.#setup.given();
		return this.#fresh?.over === given ? this.#fresh.data : given;
	}

	get at(): Cell {
		return this.wanted ?? this.data.board.selected;
	}

	/** Reads the board soon. */
	refresh(): void {
		this.#timer ??= setTimeout(
			() => {
				this.#timer = undefined;
				this.#line = this.#line.then(() => (this.wanted ? this.#open(this.wanted) : this.#read()));
			},
			Math.max(gatherMs, restTimes * this.#tookMs)
		);
	}

	/** Opens another cell. */
	go(cell: Cell): void {
		this.wanted = cell;
		this.#line = this.#line.then(() => this.#open(cell));
	}

	/** Keeps the cell open that the page chose, whatever would be chosen next time. */
	pin(): void {
		this.#line = this.#line.then(() =>
			this.#visit(this.#setup.given().board.selected, true).then(() => undefined)
		);
	}

	/** Null where the server cannot be reached: then the framework hands out what the page has already. */
	async #load(address: string): Promise<PageData | null> {
		const began = performance.now();
		try {
			const got = await preloadData(address);
			this.#tookMs = performance.now() - began;
			if (got.type !== 'loaded' || got.status !== 200 || !('board' in got.data)) return null;
			const data = got.data as PageData;
			return data.freshKey === this.#setup.given().freshKey ? null : data;
		} catch {
			return null;
		}
	}

	/** The page's own board with what changed on it; null where it must be read whole. */
	async #news(): Promise<PageData | null> {
		const began = performance.now();
		const { data } = this;
		const news = await this.#setup.news(data.board.tag, this.at);
		const board = news && withNews(data.board, news);
		if (board) this.#tookMs = performance.now() - began;
		return board && { ...data, board };
	}

	async #read(): Promise<void> {
		const ids = this.#setup.storedIds();
		const given = this.#setup.given();
		const changed = await this.#news();
		if (changed) {
			// Gone elsewhere meanwhile: the page there was read after this.
			if (this.#setup.given() !== given) return;
			this.#fresh = { over: given, data: changed };
			this.#setup.onread(ids);
			return;
		}
		// An address of its own each time: the framework keeps what it loaded for one.
		const address = `${this.#setup.href(this.at)}&read=${++this.#count}`;
		const data = await this.#load(address);
		if (!data) return;
		this.#fresh = { over: this.#setup.given(), data };
		this.#setup.onread(ids);
	}

	async #open(cell: Cell): Promise<void> {
		if (this.wanted !== cell) return;
		const { profile, workload } = this.#setup.given().board.selected;
		const there = profile === cell.profile && workload === cell.workload;
		if (!there && !(await this.#visit(cell))) return;
		if (this.wanted === cell) this.wanted = null;
		if (there) await this.#read();
	}

	/** Loaded first: the framework shows an error page for an address that it cannot reach. */
	async #visit(cell: Cell, replaceState = false): Promise<boolean> {
		const ids = this.#setup.storedIds();
		const href = this.#setup.href(cell);
		if (!(await this.#load(href))) return false;
		if (this.wanted !== null && this.wanted !== cell) return false;
		// Somebody has already clicked on: to write the address now would take their click back.
		if (replaceState && navigating.to !== null) return false;
		await goto(href, { keepFocus: true, noScroll: true, replaceState });
		this.#setup.onread(ids);
		return true;
	}

	stop(): void {
		clearTimeout(this.#timer);
		this.#timer = undefined;
	}
}
