import type { z } from 'zod';

type Query = Record<string, unknown>;

/**
 * The address of a list in another state: what is as the list shows it by default stays out, and a change of anything
 * but the page starts at the first page again.
 * @example listAddress(partsQuery, data.query, { kind: 'board' }) // '?kind=board'
 */
export function listAddress<S extends z.ZodObject>(
	schema: S,
	query: z.output<S>,
	change: Query = {}
): string {
	const plain: Query = schema.parse({});
	const state: Query = { ...(query as Query), page: 1, ...change };
	const shown = Object.entries(state).filter(
		([key, value]) => value !== undefined && value !== '' && value !== plain[key]
	);
	return `?${new URLSearchParams(shown.map(([key, value]) => [key, String(value)]))}`;
}

/** Whether anything but the order and the page differs from how the list opens. */
export function isFiltered<S extends z.ZodObject>(schema: S, query: z.output<S>): boolean {
	const plain: Query = schema.parse({});
	return Object.entries(query as Query).some(
		([key, value]) =>
			!['sort', 'way', 'page'].includes(key) && (value || undefined) !== (plain[key] || undefined)
	);
}
