import Papa from 'papaparse';

/** One reading of a campaign as its file tells it; the import takes the same file back. */
export interface ExportedReading {
	/** Slugs. */
	profile: string;
	workload: string;
	/** Number of the run among the campaign's, from 1 in the order they were recorded. */
	run: number;
	/** Number of the reading within its run, from 1. */
	repeat: number;
	value: number;
	unit: string;
	startedAt: Date;
	ambientC: number | null;
	tester: string;
	source: string;
	/** Null where it counts. */
	excludedReason: string | null;
	/** Null where its run stands. */
	voidedReason: string | null;
	/** Of the run. */
	notes: string;
}

export const exportColumns = [
	'profile',
	'workload',
	'run',
	'repeat',
	'value',
	'unit',
	'started_at',
	'ambient_c',
	'tester',
	'source',
	'excluded_reason',
	'voided_reason',
	'notes'
] as const;

/**
 * Text that a spreadsheet would take for a formula, with an apostrophe before it; `plainText` takes it off again.
 * Numbers are never touched.
 */
const safeText = (text: string): string => (/^'*[=+\-@]/.test(text) ? `'${text}` : text);

/** What `safeText` was made of. */
export const plainText = (text: string): string => (/^'+[=+\-@]/.test(text) ? text.slice(1) : text);

const cellsOf = (row: ExportedReading): (string | number)[] => [
	row.profile,
	row.workload,
	row.run,
	row.repeat,
	row.value,
	safeText(row.unit),
	row.startedAt.toISOString(),
	row.ambientC ?? '',
	safeText(row.tester),
	row.source,
	safeText(row.excludedReason ?? ''),
	safeText(row.voidedReason ?? ''),
	safeText(row.notes)
];

/** The first line of the file, by RFC 4180. */
export const readingsHeader = (): string => `${exportColumns.join(',')}\r\n`;

/**
 * Lines of the file, one a reading, by RFC 4180. Values stand with the shortest digits that read back to the very
 * same double (ECMAScript's Number::toString), times in UTC to the millisecond.
 */
export const readingsLines = (rows: readonly ExportedReading[]): string =>
	rows.length === 0 ? '' : `${Papa.unparse(rows.map(cellsOf), { newline: '\r\n' })}\r\n`;
