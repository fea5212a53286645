import type { PreviewRow, TakenReading } from '../../../domain/bench/readings-import';

/** The readings of one cell of a file, which become one run. */
export interface ImportedRun {
	profile: string;
	workload: string;
	/** In the file's own numbering where every row has one, else in the order of its lines. */
	values: number[];
	/** Of the earliest reading, ISO; null where the file gives no times. */
	startedAt: string | null;
	/** Mean of those given, in °C. */
	ambientC: number | null;
	notes: string;
}

function toRun(rows: TakenReading[], first: TakenReading): ImportedRun {
	const numbered = rows.every((row) => row.repeat !== null);
	const ordered = numbered ? [...rows].sort((a, b) => (a.repeat ?? 0) - (b.repeat ?? 0)) : rows;
	const ambients = rows.flatMap((row) => (row.ambientC === null ? [] : [row.ambientC]));
	return {
		profile: first.profile,
		workload: first.workload,
		values: ordered.map((row) => row.value),
		startedAt:
			rows
				.flatMap((row) => row.startedAt ?? [])
				.sort()
				.at(0) ?? null,
		ambientC: ambients.length > 0 ? ambients.reduce((sum, value) => sum + value, 0) / ambients.length : null,
		notes: [...new Set(rows.map((row) => row.notes).filter(Boolean))].join('\n').slice(0, 5000)
	};
}

/** The rows that an import takes, gathered into one run for each cell, in the order the file first names them. */
export function groupRows(rows: readonly PreviewRow[]): ImportedRun[] {
	const cells = new Map<string, TakenReading[]>();
	for (const row of rows) {
		if (!('taken' in row)) continue;
		const key = `${row.taken.profile}/${row.taken.workload}`;
		const list = cells.get(key);
		if (list) list.push(row.taken);
		else cells.set(key, [row.taken]);
	}
	return [...cells.values()].flatMap((list) => (list[0] ? [toRun(list, list[0])] : []));
}
