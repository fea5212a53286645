import type { CellRun } from '$lib/domain/bench/cell-runs';
import type { TypedReading } from '$lib/domain/bench/sitting';

/** A line of the entry grid that has its value. */
export interface ReadingRow {
	key: string;
	value: number;
	/** Its number among those that count; null for one that does not. */
	number: number | null;
	/** Of the stored reading. */
	id: number | null;
	excluded: string | null;
	typed: TypedReading | null;
}

type Counted = Omit<ReadingRow, 'number'>;

/** The readings of a cell in the order they were recorded, then those that are still on their way. */
export function readingRows(runs: readonly CellRun[], typed: readonly TypedReading[]): ReadingRow[] {
	const stored = runs
		.filter((run) => run.voided === null)
		.flatMap((run) => run.readings)
		.map(({ id, value, excluded }): Counted => ({ key: `r${id}`, value, id, excluded, typed: null }));
	const known = new Set(runs.flatMap((run) => run.readings.map((reading) => reading.id)));
	const coming = typed
		.filter((reading) => reading.id === undefined || !known.has(reading.id))
		.map((reading): Counted => ({
			key: reading.key,
			value: reading.value,
			id: null,
			excluded: null,
			typed: reading
		}));
	let number = 0;
	return [...stored, ...coming].map((row) => ({ ...row, number: counts(row) ? ++number : null }));
}

/** Whether a line goes into the figures: not excluded, and neither refused by the server nor held for a choice. */
export const counts = (row: Counted): boolean =>
	row.excluded === null && row.typed?.state !== 'refused' && row.typed?.state !== 'held';
