import { parseReading } from '$lib/domain/bench/numbers';

/** A field of the entry grid that has no reading yet. */
export interface Slot {
	id: number;
	text: string;
}

/** The open fields of one cell: what is half typed keeps its place while others are entered. */
export class EntrySlots {
	#slots = $state<Slot[]>([]);
	#next = $state(1);
	/** How many fields there are to be at least. */
	readonly #wanted: () => number;

	constructor(texts: readonly string[], wanted: () => number) {
		this.#wanted = wanted;
		this.append(texts);
	}

	/** The fields as they stand, filled up with empty ones. */
	get all(): Slot[] {
		const missing = Math.max(0, this.#wanted() - this.#slots.length);
		const blanks = Array.from({ length: missing }, (_, at) => ({ id: this.#next + at, text: '' }));
		return [...this.#slots, ...blanks];
	}

	/** What is typed in them. */
	get texts(): string[] {
		return this.#slots.map((slot) => slot.text).filter((text) => text.trim() !== '');
	}

	/** Those of them that are readings already. */
	get values(): number[] {
		return this.texts.flatMap((text) => {
			const parsed = parseReading(text);
			return parsed.ok ? [parsed.value] : [];
		});
	}

	#settle(id: number): void {
		const last = this.all.findIndex((slot) => slot.id === id);
		this.#slots = this.all.slice(0, Math.max(this.#slots.length, last + 1));
		this.#next = Math.max(this.#next, ...this.#slots.map((slot) => slot.id + 1));
	}

	write(id: number, text: string): void {
		this.#settle(id);
		this.#slots = this.#slots.map((slot) => (slot.id === id ? { id, text } : slot));
	}

	/** Takes the reading out of a field and closes the field; null where there is none in it. */
	take(id: number): number | null {
		const slot = this.all.find((one) => one.id === id);
		const parsed = slot ? parseReading(slot.text) : null;
		if (!parsed?.ok) return null;
		this.#settle(id);
		this.#slots = this.#slots.filter((one) => one.id !== id);
		return parsed.value;
	}

	append(texts: readonly string[]): void {
		const filled = this.#slots.filter((slot) => slot.text !== '');
		this.#slots = [...filled, ...texts.map((text, at) => ({ id: this.#next + at, text }))];
		this.#next += texts.length;
	}
}
