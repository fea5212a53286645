import Papa from 'papaparse';
import { refuse, type Refusal } from '../shared/outcome';

export const columns = [
	'profile',
	'workload',
	'value',
	'unit',
	'run',
	'repeat',
	'started_at',
	'ambient_c',
	'tester',
	'source',
	'excluded_reason',
	'voided_reason',
	'notes'
] as const;
export type Column = (typeof columns)[number];

const needed: readonly Column[] = ['profile', 'workload', 'value'];
const delimiters = [',', ';', '\t'];

/** A file of readings is small; larger ones are logs, or not readings at all. */
const mostCharacters = 5_000_000;
const mostRows = 10_000;

/** A line of the file with its cells by column; a cell that is missing is empty. */
export interface CsvLine {
	/** As an editor of text counts them, the header being line 1. */
	line: number;
	cells: Record<Column, string>;
	/** Whether it has filled cells beyond the last heading, as after a decimal comma that was taken for a delimiter. */
	overflows: boolean;
	/** As it was written, for the person who has to find it. */
	raw: string;
}

export interface CsvTable {
	ok: true;
	delimiter: string;
	/** Headings that were not understood and are left out. */
	ignored: string[];
	lines: CsvLine[];
}

/** @example columnOf(' Started at ') // 'started_at' */
function columnOf(heading: string): Column | null {
	const name = heading
		.trim()
		.toLowerCase()
		.replace(/[\s-]+/g, '_');
	return columns.find((column) => column === name) ?? null;
}

const headings = (header: string, delimiter: string): string[] =>
	Papa.parse<string[]>(header, { delimiter, preview: 1 }).data[0] ?? [];

const understood = (header: string, delimiter: string): number =>
	headings(header, delimiter).filter((heading) => columnOf(heading) !== null).length;

function checkHeader(names: readonly string[]): Refusal<'invalid'> | null {
	const found = names.map(columnOf);
	const missing = needed.filter((column) => !found.includes(column));
	if (missing.length > 0) {
		const listed = names
			.map((name) => name.trim())
			.filter(Boolean)
			.slice(0, 12)
			.join(', ');
		return refuse(
			'invalid',
			`The first line must name the columns profile, workload and value. It lacks ${missing.join(' and ')}; it has: ${listed || 'nothing'}. Nothing was imported.`
		);
	}
	const twice = columns.find((column) => found.filter((name) => name === column).length > 1);
	return twice
		? refuse('invalid', `The column ${twice} is there twice. Keep one of them; nothing was imported.`)
		: null;
}

interface CsvRecord {
	line: number;
	raw: string;
	cells: string[];
}

/** The records of a file with the line each begins at: a quoted cell may run over several lines. */
function records(body: string, delimiter: string): { found: CsvRecord[]; brokenAt: number | null } {
	const found: CsvRecord[] = [];
	let brokenAt: number | null = null;
	let line = 1;
	let from = 0;
	Papa.parse<string[]>(body, {
		delimiter,
		newline: '\n',
		step: ({ data, errors, meta }, parser) => {
			const raw = body.slice(from, meta.cursor).replace(/\n$/, '');
			if (errors.some((error) => error.type === 'Quotes')) brokenAt ??= line;
			if (data.some((cell) => cell.trim() !== '')) found.push({ line, raw, cells: data });
			line += raw.split('\n').length;
			from = meta.cursor;
			// One more than may be taken is enough to know that there are too many; the header is one too.
			if (found.length > mostRows + 1 || brokenAt !== null) parser.abort();
		}
	});
	return { found, brokenAt };
}

/** Cells by column, and whether the line has filled cells that no heading stands over. */
function byColumn({ line, raw, cells }: CsvRecord, at: Record<Column, number>, width: number): CsvLine {
	const cell = (column: Column): string => (cells[at[column]] ?? '').trim();
	return {
		line,
		raw,
		cells: Object.fromEntries(columns.map((column) => [column, cell(column)])) as Record<Column, string>,
		overflows: cells.slice(width).some((extra) => extra.trim() !== '')
	};
}

/**
 * The lines of a CSV of readings by column, whatever its delimiter (comma, semicolon or tab), its order and case
 * of headings, its line ends, with or without a byte-order mark. Refused whole: without the columns it needs,
 * with more than 10,000 rows or 5 million characters, or with quotes that do not close.
 */
export function readReadingsCsv(text: string): CsvTable | Refusal<'invalid' | 'too_large'> {
	if (text.length > mostCharacters) {
		return refuse(
			'too_large',
			'That file is too large for readings. Nothing was imported; split it, or upload it as a log.'
		);
	}
	const body = text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');
	const header = body.trimStart().slice(0, 10_000).split('\n')[0] ?? '';
	if (header === '') return refuse('invalid', 'That file is empty. Nothing was imported.');
	const delimiter = delimiters.reduce((best, next) =>
		understood(header, next) > understood(header, best) ? next : best
	);
	const names = headings(header, delimiter).map((name) => name.trim());
	const wrong = checkHeader(names);
	if (wrong) return wrong;

	const { found, brokenAt } = records(body, delimiter);
	const [, ...rows] = found;
	if (brokenAt !== null) {
		return refuse(
			'invalid',
			`The quotes on line ${brokenAt} do not close. Nothing was imported; mend that line.`
		);
	}
	if (rows.length === 0)
		return refuse('invalid', 'That file has headings but no readings. Nothing was imported.');
	if (rows.length > mostRows) {
		return refuse('too_large', 'That file has more than 10,000 readings. Nothing was imported; split it.');
	}
	const position = (column: Column): number => names.findIndex((name) => columnOf(name) === column);
	const at = Object.fromEntries(columns.map((column) => [column, position(column)])) as Record<
		Column,
		number
	>;
	return {
		ok: true,
		delimiter,
		ignored: names.filter((name) => name !== '' && columnOf(name) === null),
		lines: rows.map((row) => byColumn(row, at, names.length))
	};
}
