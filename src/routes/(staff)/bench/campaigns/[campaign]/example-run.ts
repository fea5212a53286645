import type { CellRun } from '$lib/domain/bench/cell-runs';

interface Cell {
	profile: string;
	workload: string;
	runs: readonly CellRun[];
	baselineValues: readonly number[] | null;
}

/**
 * A run as a script would send it to the cell that is open: its own readings as the example, else the baseline's, so
 * that the figures are of the size that is measured there.
 */
export function exampleRun(cell: Cell, workloads: readonly { slug: string; unit: string }[]) {
	const own = cell.runs
		.filter((run) => run.voided === null)
		.flatMap((run) => run.readings.filter((reading) => reading.excluded === null))
		.map((reading) => reading.value);
	const readings = own.length > 0 ? own : (cell.baselineValues ?? []);
	return {
		profile: cell.profile,
		workload: cell.workload,
		unit: workloads.find(({ slug }) => slug === cell.workload)?.unit ?? '',
		readings: readings.length > 0 ? readings.slice(0, 3) : [1]
	};
}
