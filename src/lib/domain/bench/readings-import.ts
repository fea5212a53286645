import { DateTime } from 'luxon';
import { nearest } from '../shared/nearest';
import type { Refusal } from '../shared/outcome';
import { decimalMarkOf, parseReading, quoted, type DecimalMark } from './numbers';
import { readReadingsCsv, type CsvLine } from './readings-csv';

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
	/** As the file numbers it; null where it does not. */
	repeat: number | null;
	/** ISO time in UTC; null where the file gives none. */
	startedAt: string | null;
	ambientC: number | null;
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

// The micro sign and the Greek letter look the same and are both typed.
const sameUnit = (a: string, b: string): boolean =>
	a.replaceAll('\u00b5', '\u03bc') === b.replaceAll('\u00b5', '\u03bc');

function readRepeat(text: string): Checked<number | null> {
	if (text === '') return { value: null };
	return /^[1-9]\d{0,3}$/.test(text)
		? { value: Number(text) }
		: reason(`The repeat ${quoted(text)} is not a whole number from 1 to 9999.`);
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
	const { unit } = workload.value;
	if (cells.unit !== '' && !sameUnit(cells.unit, unit)) {
		return reason(`The unit is ${quoted(cells.unit)}, but ${workload.value.slug} is measured in ${unit}.`);
	}
	const repeat = readRepeat(cells.repeat);
	if ('reason' in repeat) return repeat;
	const startedAt = readStart(cells.started_at, target.zone);
	if ('reason' in startedAt) return startedAt;
	const ambientC = readAmbient(cells.ambient_c, decimalMark);
	if ('reason' in ambientC) return ambientC;
	if (cells.notes.length > 2000) return reason('The notes are longer than 2,000 characters.');
	return {
		value: {
			profile: profile.value.slug,
			workload: workload.value.slug,
			value: value.value,
			repeat: repeat.value,
			startedAt: startedAt.value,
			ambientC: ambientC.value,
			notes: cells.notes
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
 * reason in words. Columns: profile, workload, value, and if wanted unit, repeat, started_at, ambient_c, notes.
 * The same profile, workload and repeat twice: the first is taken. A file that cannot be read at all is refused.
 */
export function previewImport(
	text: string,
	target: ImportTarget
): ImportPreview | Refusal<'invalid' | 'too_large'> {
	const table = readReadingsCsv(text);
	if (!table.ok) return table;
	const decimalMark = markOf(table.lines, table.delimiter);
	const firstLines = new Map<string, number>();
	const rows = table.lines.map((row): PreviewRow => {
		const { line, raw } = row;
		const checked = check(row, target, decimalMark);
		if ('reason' in checked) return { line, refused: checked.reason, raw };
		const taken = checked.value;
		if (taken.repeat === null) return { line, taken };
		const key = `${taken.profile}/${taken.workload}/${taken.repeat}`;
		const first = firstLines.get(key);
		if (first !== undefined) {
			return { line, refused: `Repeat ${taken.repeat} of this cell is on line ${first} already.`, raw };
		}
		firstLines.set(key, line);
		return { line, taken };
	});
	const taken = rows.filter((row) => 'taken' in row).length;
	return { ok: true, rows, taken, refused: rows.length - taken, ignored: table.ignored, decimalMark };
}
