import type { PreviewRow, TakenReading } from '../../../domain/bench/readings-import';

export interface ImportedReading {
	value: number;
	/** Why it does not count; empty where it does. */
	excludedReason: string;
}

/** The readings of one cell of a file, or of one of its numbered runs, which become one run. */
export interface ImportedRun {
	profile: string;
	workload: string;
	/** In the file's own numbering where every row has one, else in the order of its lines. */
	readings: ImportedReading[];
	/** Of the earliest reading, ISO; null where the file gives no times. */
	startedAt: string | null;
	/** Mean of those given, in °C. */
	ambientC: number | null;
	/** Why none of it counts; empty where it does. */
	voidedReason: string;
	/** Who took it and how, as the file says; empty where it does not. */
	tester: string;
	source: string;
	notes: string;
}

const distinct = (texts: readonly string[]): string[] => [...new Set(texts.filter(Boolean))];

/** The mean; of equal numbers that number itself, to the last bit. */
function meanOf(numbers: readonly number[]): number | null {
	const [first] = numbers;
	if (first === undefined) return null;
	return numbers.every((number) => number === first)
		? first
		: numbers.reduce((sum, number) => sum + number, 0) / numbers.length;
}

function toRun(rows: TakenReading[], first: TakenReading): ImportedRun {
	const numbered = rows.every((row) => row.repeat !== null);
	const ordered = numbered ? [...rows].sort((a, b) => (a.repeat ?? 0) - (b.repeat ?? 0)) : rows;
	return {
		profile: first.profile,
		workload: first.workload,
		readings: ordered.map(({ value, excludedReason }) => ({ value, excludedReason })),
		startedAt:
			rows
				.flatMap((row) => row.startedAt ?? [])
				.sort()
				.at(0) ?? null,
		ambientC: meanOf(rows.flatMap((row) => row.ambientC ?? [])),
		voidedReason: first.voidedReason,
		tester: distinct(rows.map((row) => row.tester))
			.join(', ')
			.slice(0, 500),
		source: distinct(rows.map((row) => row.source))
			.join(', ')
			.slice(0, 500),
		notes: distinct(rows.map((row) => row.notes))
			.join('\n')
			.slice(0, 5000)
	};
}

/**
 * The rows that an import takes, gathered into the runs the file numbers; where it numbers none, into one run for each
 * cell. In the order of their numbers, or else in which the file first names them.
 */
export function groupRows(rows: readonly PreviewRow[]): ImportedRun[] {
	const runs = new Map<string, TakenReading[]>();
	for (const row of rows) {
		if (!('taken' in row)) continue;
		const key = `${row.taken.profile}/${row.taken.workload}/${row.taken.run ?? ''}`;
		const list = runs.get(key);
		if (list) list.push(row.taken);
		else runs.set(key, [row.taken]);
	}
	const number = (list: TakenReading[]) => list[0]?.run ?? 0;
	return [...runs.values()]
		.sort((a, b) => number(a) - number(b))
		.flatMap((list) => (list[0] ? [toRun(list, list[0])] : []));
}
