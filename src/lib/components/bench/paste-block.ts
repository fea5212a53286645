import { decimalMarkOf, parseBlock, parseReading } from '$lib/domain/bench/numbers';
import { plainReadingsLimit, readingsPerRun } from '$lib/schemas/run';

/** A column of a pasted block: the values that are readings, and texts that are not and stay to be mended. */
export interface PastedColumn {
	values: number[];
	faults: string[];
}

export type Pasted =
	/** One value: the field takes it as it would anyway. */
	| { kind: 'single' }
	/** Too much: nothing was entered. */
	| { kind: 'refused'; message: string }
	/** One column or row of one cell. */
	| ({ kind: 'block'; message: string } & PastedColumn)
	/** Several columns: looked at before they are entered. */
	| { kind: 'columns'; columns: PastedColumn[] };

const many = new Intl.NumberFormat('en');

/** What was entered of a column, in words. */
export function enteredWords({ values, faults }: PastedColumn): string {
	const entered = values.length === 1 ? '1 reading entered' : `${values.length} readings entered`;
	const left =
		faults.length === 1 ? '1 waits below to be looked at' : `${faults.length} wait below to be looked at`;
	return faults.length > 0 ? `${entered}; ${left}.` : `${entered}.`;
}

/** Columns as one, row by row: what all of a block is where it goes into one cell. */
export const asOne = (columns: readonly PastedColumn[]): PastedColumn => ({
	values: columns.flatMap((column) => column.values),
	faults: columns.flatMap((column) => column.faults)
});

/**
 * What a paste into the grid means. A block writes its decimals in one way, told from all of it.
 * @param taken readings the sitting has already
 */
export function pasteBlock(text: string, taken: number): Pasted {
	if (text.length > plainReadingsLimit)
		return {
			kind: 'refused',
			message: `That is too much to paste at once (${many.format(text.length)} characters). Nothing was entered and nothing was lost. Paste the readings alone, at most ${readingsPerRun} of them.`
		};
	if (!/[\t\n\r]/.test(text.trim())) return { kind: 'single' };
	const block = parseBlock(text);
	if (!block.ok) return { kind: 'refused', message: block.message };
	const cells = block.rows.flat().filter((cell) => cell !== '');
	if (cells.length + taken > readingsPerRun)
		return {
			kind: 'refused',
			message: `That block has ${many.format(cells.length)} readings, and a run takes ${readingsPerRun}. Nothing was entered; paste a smaller block.`
		};
	const mark = decimalMarkOf(cells);
	const width = Math.max(...block.rows.map((row) => row.length));
	const columns = Array.from({ length: width }, (_, at): PastedColumn => {
		const column: PastedColumn = { values: [], faults: [] };
		for (const cell of block.rows.flatMap((row) => row[at] || [])) {
			const parsed = parseReading(cell, mark);
			if (parsed.ok) column.values.push(parsed.value);
			else column.faults.push(cell);
		}
		return column;
	});
	const [first] = columns;
	if (first && columns.length === 1) return { kind: 'block', ...first, message: enteredWords(first) };
	return { kind: 'columns', columns };
}
