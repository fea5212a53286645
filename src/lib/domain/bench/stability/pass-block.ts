import { parseBlock } from '../numbers';

export type PassBlock =
	| {
			ok: true;
			rows: { threads: string; currentA: string; clockMHz: string }[];
			/** The line each row stands on, from 1. */
			lines: number[];
	  }
	| { ok: false; message: string };

/** Typed by hand, cells stand apart by spaces or semicolons; from a spreadsheet, by tabs. */
const cellsOf = (row: string[]): string[] =>
	row.length === 1 ? (row[0] ?? '').split(/\s*;\s*|\s+/).filter((cell) => cell !== '') : row;

/**
 * A pass pasted as a block, one point a line: threads, current in A, clock in MHz. A line of headings is left out.
 * Refused where a line has not three cells; what is not a number stays as it is, to be refused with its reason.
 */
export function passBlock(text: string): PassBlock {
	const block = parseBlock(text);
	if (!block.ok) return block;
	const rows: Extract<PassBlock, { ok: true }>['rows'] = [];
	const lines: number[] = [];
	for (const [index, row] of block.rows.entries()) {
		const cells = cellsOf(row);
		if (cells.length === 0 || cells.every((cell) => cell === '')) continue;
		if (index === 0 && !/\d/.test(cells[0] ?? '')) continue;
		const [threads = '', currentA = '', clockMHz = '', ...more] = cells;
		if (clockMHz === '' || more.some((cell) => cell !== ''))
			return {
				ok: false,
				message: `Line ${index + 1} has not three cells: write threads, current in A and clock in MHz. Nothing was entered.`
			};
		rows.push({ threads, currentA, clockMHz });
		lines.push(index + 1);
	}
	return rows.length > 0
		? { ok: true, rows, lines }
		: { ok: false, message: 'Write one point a line: threads, current in A, clock in MHz.' };
}
