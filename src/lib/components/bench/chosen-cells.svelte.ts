import { SvelteSet } from 'svelte/reactivity';

/** Keys of the cells on the screen, row by row. */
export type CellGrid = readonly (readonly string[])[];

const steps: Record<string, [number, number]> = {
	ArrowUp: [-1, 0],
	ArrowDown: [1, 0],
	ArrowLeft: [0, -1],
	ArrowRight: [0, 1]
};

const placeOf = (grid: CellGrid, key: string): [number, number] | null => {
	const row = grid.findIndex((cells) => cells.includes(key));
	return row < 0 ? null : [row, grid[row]?.indexOf(key) ?? 0];
};

/** Every cell of the rectangle between two. */
function between(grid: CellGrid, one: string, other: string): string[] {
	const [from, to] = [placeOf(grid, one), placeOf(grid, other)];
	if (!from || !to) return [other];
	const [top, bottom] = [Math.min(from[0], to[0]), Math.max(from[0], to[0])];
	const [left, right] = [Math.min(from[1], to[1]), Math.max(from[1], to[1])];
	return grid.slice(top, bottom + 1).flatMap((cells) => cells.slice(left, right + 1));
}

/** The cells ticked on a board: one by one, or all between two with Shift; arrows move from box to box. */
export class ChosenCells {
	readonly #keys = new SvelteSet<string>();
	/** The box ticked last by itself: the corner that Shift keeps. */
	#corner: string | null = null;

	get size(): number {
		return this.#keys.size;
	}

	has(key: string): boolean {
		return this.#keys.has(key);
	}

	/** @param grid given where all from the corner on are meant */
	choose(key: string, chosen: boolean, grid: CellGrid | null): void {
		const keys = grid && this.#corner !== null ? between(grid, this.#corner, key) : [key];
		for (const one of keys) {
			if (chosen) this.#keys.add(one);
			else this.#keys.delete(one);
		}
		if (!grid) this.#corner = key;
	}

	clear(): void {
		this.#keys.clear();
		this.#corner = null;
	}

	move(event: KeyboardEvent, grid: CellGrid): void {
		const step = steps[event.key];
		const box = event.target;
		if (!step || !(box instanceof HTMLInputElement) || event.altKey || event.ctrlKey) return;
		event.preventDefault();
		const row = Number(box.dataset.row) + step[0];
		const column = Number(box.dataset.column) + step[1];
		const key = grid[row]?.[column];
		if (key === undefined) return;
		if (event.shiftKey) {
			if (this.#corner === null) this.choose(box.value, true, null);
			this.choose(key, true, grid);
		}
		box
			.closest('table')
			?.querySelector<HTMLInputElement>(`[data-row="${row}"][data-column="${column}"]`)
			?.focus();
	}
}
