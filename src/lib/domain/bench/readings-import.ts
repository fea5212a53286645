import { DateTime } from 'luxon';
import { nearest } from '../shared/nearest';
import type { Refusal } from '../shared/outcome';
import { decimalMarkOf, parseReading, quoted, type DecimalMark } from './numbers';
import { readReadingsCsv, type CsvLine } from './readings-csv';
import { plainText } from './readings-writer';
import { seenRows } from './seen-rows';
import { unitFault } from './unit-fault';

/** What the file's names are held against. */
export interface ImportTarget {
	profiles: { slug: string; name: string }[];
	workloads: { slug: string; name: string; unit: string }[];
	/** Zone of times written without one, such as Europe/Oslo. */
	zone: string;
}

export interface TakenReading {
	/** Slugs. */
	profile: string;
	workload: string;
	/** In the workload's unit. */
	value: number;
	/** The run's number in the file; null where all of a cell is one run. */
	run: number | null;
	/** As the file numbers it within its run, or its cell where runs are not numbered; null where it does not. */
	repeat: number | null;
	/** ISO time in UTC; null where the file gives none. */
	startedAt: string | null;
	ambientC: number | null;
	/** Who took it and how, as the file says; empty where it does not. */
	tester: string;
	source: string;
	/** Why it does not count, or why its whole run does not; empty where it does. */
	excludedReason: string;
	voidedReason: string;
	notes: string;
}

export type PreviewRow =
	{ line: number; taken: TakenReading } | { line: number; refused: string; raw: string };

export interface ImportPreview {
	ok: true;
	/** In the order of the file. */
	rows: PreviewRow[];
	taken: number;
	refused: number;
	/** Headings that were left out. */
	ignored: string[];
	decimalMark: DecimalMark;
}

type Words = Pick<TakenReading, 'tester' | 'source' | 'excludedReason' | 'voidedReason' | 'notes'>;

type Checked<T> = { value: T } | { reason: string };

const reason = (text: string): { reason: string } => ({ reason: text });

function find<T extends { slug: string; name: string }>(
	kind: string,
	typed: string,
	among: readonly T[]
): Checked<T> {
	const wanted = typed.toLowerCase();
	const hit =
		among.find((item) => item.slug.toLowerCase() === wanted) ??
		among.find((item) => item.name.toLowerCase() === wanted);
	if (hit) return { value: hit };
	if (typed === '') return reason(`The ${kind} is missing.`);
	const near = nearest(
		typed,
		among.map((item) => item.slug)
	);
	const hint = near.length > 0 ? ` Nearest: ${near.join(', ')}.` : '';
	return reason(`This campaign has no ${kind} ${quoted(typed)}.${hint}`);
}

function readValue(text: string, decimalMark: DecimalMark): Checked<number> {
	if (text === '') return reason('The value is missing.');
	const parsed = parseReading(text, decimalMark);
	return parsed.ok ? parsed : reason(parsed.message);
}

/** A number that counts runs or repeats; null where the cell is empty. */
function readCount(kind: 'run' | 'repeat', text: string, most: number): Checked<number | null> {
	if (text === '') return { value: null };
	return /^[1-9]\d{0,8}$/.test(text) && Number(text) <= most
		? { value: Number(text) }
		: reason(`The ${kind} ${quoted(text)} is not a whole number from 1 to ${most}.`);
}

/** What stands in words beside a reading. */
function readWords(cells: CsvLine['cells']): Checked<Words> {
	const words = {
		tester: plainText(cells.tester),
		source: plainText(cells.source),
		excludedReason: plainText(cells.excluded_reason),
		voidedReason: plainText(cells.voided_reason),
		notes: plainText(cells.notes)
	};
	if (words.notes.length > 5000) return reason('The notes are longer than 5,000 characters.');
	if (words.excludedReason.length > 500 || words.voidedReason.length > 500)
		return reason('A reason is longer than 500 characters.');
	return words.tester.length > 200 || words.source.length > 200
		? reason('The tester or the source is longer than 200 characters.')
		: { value: words };
}

function readStart(text: string, zone: string): Checked<string | null> {
	if (text === '') return { value: null };
	const iso = DateTime.fromISO(text, { zone });
	const time = iso.isValid ? iso : DateTime.fromSQL(text, { zone });
	const utc =
		/^\d{4}-\d{2}-\d{2}[T ]\d/i.test(text) && time.isValid && time.year >= 1970 ? time.toUTC().toISO() : null;
	return utc === null
		? reason(
				`The time ${quoted(text)} is not understood. Write it as 2026-05-04T09:30:00Z or 2026-05-04 09:30.`
			)
		: { value: utc };
}

function readAmbient(text: string, decimalMark: DecimalMark): Checked<number | null> {
	if (text === '') return { value: null };
	const parsed = parseReading(text, decimalMark);
	if (!parsed.ok) return reason(`Ambient temperature: ${parsed.message}`);
	return parsed.value >= -60 && parsed.value <= 100
		? parsed
		: reason(`The ambient temperature ${quoted(text)} is not between −60 and 100 °C.`);
}

function check(row: CsvLine, target: ImportTarget, decimalMark: DecimalMark): Checked<TakenReading> {
	const { cells } = row;
	if (row.overflows) {
		return reason(
			'This line has more cells than there are headings. A value with a comma in it needs quotes around it.'
		);
	}
	const profile = find('profile', cells.profile, target.profiles);
	if ('reason' in profile) return profile;
	const workload = find('workload', cells.workload, target.workloads);
	if ('reason' in workload) return workload;
	const value = readValue(cells.value, decimalMark);
	if ('reason' in value) return value;
	const fault = cells.unit === '' ? null : unitFault(plainText(cells.unit), workload.value);
	if (fault) return reason(fault);
	const run = readCount('run', cells.run, 999_999);
	if ('reason' in run) return run;
	const repeat = readCount('repeat', cells.repeat, 9999);
	if ('reason' in repeat) return repeat;
	const startedAt = readStart(cells.started_at, target.zone);
	if ('reason' in startedAt) return startedAt;
	const ambientC = readAmbient(cells.ambient_c, decimalMark);
	if ('reason' in ambientC) return ambientC;
	const words = readWords(cells);
	if ('reason' in words) return words;
	return {
		value: {
			profile: profile.value.slug,
			workload: workload.value.slug,
			value: value.value,
			run: run.value,
			repeat: repeat.value,
			startedAt: startedAt.value,
			ambientC: ambientC.value,
			...words.value
		}
	};
}

/** A semicolon file comes from where a comma marks decimals; otherwise the numbers themselves must tell. */
function markOf(lines: readonly CsvLine[], delimiter: string): DecimalMark {
	const values = lines.map((row) => row.cells.value);
	const mark = decimalMarkOf(values);
	const commas = values.some((text) => text.includes(','));
	const points = values.some((text) => text.includes('.'));
	return mark === 'either' && delimiter === ';' && commas && !points ? 'comma' : mark;
}

/**
 * What an import of a CSV of readings would do, row by row: each that it takes, and each that it refuses with the
 * reason in words. Columns: profile, workload, value, and if wanted unit, run, repeat, started_at, ambient_c, tester,
 * source, excluded_reason, voided_reason, notes. The same profile, workload, run and repeat twice: the first is taken.
 * A file that cannot be read at all is refused.
 */
export function previewImport(
	text: string,
	target: ImportTarget
): ImportPreview | Refusal<'invalid' | 'too_large'> {
	const table = readReadingsCsv(text);
	if (!table.ok) return table;
	const decimalMark = markOf(table.lines, table.delimiter);
	const seen = seenRows();
	const rows = table.lines.map((row): PreviewRow => {
		const { line, raw } = row;
		const checked = check(row, target, decimalMark);
		if ('reason' in checked) return { line, refused: checked.reason, raw };
		const fault = seen(line, checked.value);
		return fault === null ? { line, taken: checked.value } : { line, refused: fault, raw };
	});
	const taken = rows.filter((row) => 'taken' in row).length;
	return { ok: true, rows, taken, refused: rows.length - taken, ignored: table.ignored, decimalMark };
}
