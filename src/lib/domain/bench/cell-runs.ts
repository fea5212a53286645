import type { RunSource } from './words';

export interface CellReading {
	id: number;
	value: number;
	/** The reason, where it does not count. */
	excluded: string | null;
}

/** A run of one cell, as the bench shows it. */
export interface CellRun {
	id: number;
	version: number;
	tester: string;
	source: RunSource;
	startedAt: Date;
	ambientC: number | null;
	notes: string;
	/** The reason, where the run does not count. */
	voided: string | null;
	readings: CellReading[];
}
