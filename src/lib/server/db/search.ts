import { and, asc, desc, gt, isNotNull, isNull, like, or, type Column, type SQL } from 'drizzle-orm';

/** Rows in which each word is found in one of the columns; undefined when there are no words. */
export function containsWords(words: string, columns: Column[]): SQL | undefined {
	const each = words
		.split(/\s+/)
		.filter((word) => word !== '')
		.slice(0, 8)
		.map((word) => `%${word.replace(/[\\%_]/g, '\\$&')}%`);
	return and(...each.map((pattern) => or(...columns.map((column) => like(column, pattern)))));
}

export type Way = 'up' | 'down';

/** The order a list asks for, with the id last so that pages never overlap. */
export const ordered = (columns: (Column | SQL)[], way: Way, id: Column): SQL[] => {
	const turn = way === 'up' ? asc : desc;
	return [...columns, id].map((column) => turn(column));
};

/** Row numbers among references: slugs always carry a letter, so a reference of digits is an id. */
export const idsAmong = (refs: string[]): number[] =>
	refs.filter((ref) => /^[1-9]\d{0,9}$/.test(ref)).map(Number);

/** A page of a list: how many rows, after how many. */
export interface Window {
	limit: number;
	offset: number;
}

/** Rows behind a cursor, which is the id of the last row seen; all of them without one. */
export const behind = (id: Column, after: number | undefined): SQL | undefined =>
	after === undefined ? undefined : gt(id, after);

export type ArchiveState = 'open' | 'archived' | 'all';

/** Rows that are still in use, those put away, or both. */
export const inArchive = (archivedAt: Column, state: ArchiveState): SQL | undefined =>
	state === 'all' ? undefined : state === 'archived' ? isNotNull(archivedAt) : isNull(archivedAt);
