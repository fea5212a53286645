import type { BoardQuery } from '$lib/schemas/campaign';

/** The address of a board with a cell opened, its filter kept; what is empty stays out of it. */
export function boardAddress(base: string, query: BoardQuery): string {
	const params = new URLSearchParams();
	for (const [name, value] of Object.entries(query)) if (value !== '') params.set(name, value);
	return `${base}?${params}`;
}
