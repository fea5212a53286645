import Papa from 'papaparse';

export type ParsedNumber = { ok: true; value: number } | { ok: false; message: string };

/** How a file writes decimals, where that is known; typed numbers may use either. */
export type DecimalMark = 'point' | 'comma' | 'either';

/** Larger than anything a bench measures, bytes and hertz included; below the least the statistics would vanish. */
const greatest = 1e15;
const least = 1e-100;

/** Whether a number can be kept as a reading: finite, and zero or between 1e-100 and 1e15 in size. */
export const isReading = (value: number): boolean =>
	value === 0 || (Math.abs(value) >= least && Math.abs(value) <= greatest);

const refused = (message: string): ParsedNumber => ({ ok: false, message });

// A space between digits groups thousands: plain, no-break, thin, figure or narrow no-break.
const space = '[ \\u00a0\\u2007\\u2009\\u202f]';
const written = new RegExp(
	`^([+-]?)(\\d{1,3}(?:${space}\\d{3})+|\\d+)?(?:([.,])(\\d*))?(?:e([+-]?\\d{1,6}))?$`,
	'i'
);
const ambiguousComma = /^[+-]?[1-9]\d{0,2},\d{3}$/;

/** Shortens what was typed for a message about it. */
export const quoted = (text: string): string => `“${text.length > 40 ? `${text.slice(0, 40)}…` : text}”`;

function outOfForm(text: string): ParsedNumber {
	if (/^[+-]?(nan|inf|infinity|∞)$/i.test(text)) {
		return refused(`${quoted(text)} is not a measured value. Enter a number, or leave the cell empty.`);
	}
	if (/[.,].*[.,]/.test(text) && /^[\d.,+-]+$/.test(text)) {
		return refused(
			`${quoted(text)} has more than one decimal mark. Leave thousands separators out, such as 1234.5.`
		);
	}
	if (/^[+-]?[\d.,]+\s*[^\d\s.,+-]/.test(text) && !/^[+-]?0[xbo]/i.test(text)) {
		return refused(`${quoted(text)} has text in it. Enter the number alone, without its unit.`);
	}
	return refused(`${quoted(text)} is not a number. Enter a number such as 124.5.`);
}

/**
 * A reading as a person or a file writes it: decimal point or comma, spaces between thousands, a minus sign of
 * either kind, a power of ten. Refused with the reason: text, nothing, NaN, Infinity, other bases, what is too
 * large or small for a reading, and a comma that could as well group thousands (1,234) where the file does not settle it.
 * @example parseReading('3 322 298,25') // { ok: true, value: 3322298.25 }
 */
export function parseReading(typed: string, decimal: DecimalMark = 'either'): ParsedNumber {
	const text = typed.trim().replaceAll('\u2212', '-');
	if (text === '') return refused('Enter a number.');
	if (text.length > 400) return refused('That is too long for a number.');
	const match = written.exec(text);
	const [, sign = '', whole = '', mark, fraction = '', power = '0'] = match ?? [];
	if (!match || whole + fraction === '') return outOfForm(text);
	if (decimal === 'comma' && mark === '.') {
		return refused(`${quoted(text)} has a decimal point, but this file writes decimals with a comma.`);
	}
	if (decimal === 'point' && mark === ',') {
		return refused(
			`${quoted(text)} has a comma, but this file writes decimals with a point. Leave thousands separators out.`
		);
	}
	if (decimal === 'either' && ambiguousComma.test(text)) {
		const [left = '', right = ''] = text.split(',');
		return refused(`${quoted(text)} can be read in two ways. Enter ${left}.${right} or ${left}${right}.`);
	}
	const digits = whole.replace(/\D/g, '');
	const value = Number(`${sign}${digits || '0'}.${fraction || '0'}e${power}`);
	if (Math.abs(value) > greatest)
		return refused(
			`${quoted(text)} is too large: larger than anything a bench measures (1e15). Check its unit and its decimal mark.`
		);
	if (!isReading(value) || (value === 0 && /[1-9]/.test(digits + fraction))) {
		return refused(`${quoted(text)} is too small to be a reading.`);
	}
	return { ok: true, value: value === 0 ? 0 : value };
}

/** How a set of written numbers marks decimals, told from those that can be read in one way only. */
export function decimalMarkOf(texts: readonly string[]): DecimalMark {
	const commas = texts.some(
		(text) => /^[^.,]*,[^.,]*$/.test(text.trim()) && !ambiguousComma.test(text.trim())
	);
	const points = texts.some((text) => /^[^.,]*\.[^.,]*$/.test(text.trim()));
	if (commas === points) return 'either';
	return commas ? 'comma' : 'point';
}

const mostCells = 10_000;
const mostCharacters = 1_000_000;

export type Block = { ok: true; rows: string[][] } | { ok: false; message: string };

/**
 * A block pasted from a spreadsheet, as rows of trimmed cells: tabs between cells, lines between rows, quotes
 * around a cell with either in it. Refused beyond 10,000 cells or a million characters; nothing is cut off.
 * @example parseBlock('1\t2\r\n3\t4\r\n') // { ok: true, rows: [['1', '2'], ['3', '4']] }
 */
export function parseBlock(text: string): Block {
	if (text.length > mostCharacters) {
		return {
			ok: false,
			message: 'That is too much to paste at once. Nothing was entered; paste a smaller block.'
		};
	}
	const body = text
		.replace(/^\ufeff/, '')
		.replace(/\r\n?/g, '\n')
		.replace(/\n+$/, '');
	if (body.trim() === '') return { ok: false, message: 'There is nothing in what was pasted.' };
	const { data } = Papa.parse<string[]>(body, { delimiter: '\t', newline: '\n' });
	const rows = data.map((row) => row.map((cell) => cell.trim()));
	const cells = rows.reduce((sum, row) => sum + row.length, 0);
	return cells > mostCells
		? {
				ok: false,
				message: `That block has more than ${mostCells.toLocaleString('en')} cells. Nothing was entered; paste a smaller block.`
			}
		: { ok: true, rows };
}
