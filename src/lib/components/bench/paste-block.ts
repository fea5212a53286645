import { decimalMarkOf, parseBlock, parseReading } from '$lib/domain/bench/numbers';
import { plainReadingsLimit, readingsPerRun } from '$lib/schemas/run';

export type Pasted =
	/** One value: the field takes it as it would anyway. */
	| { kind: 'single' }
	/** Too much: nothing was entered. */
	| { kind: 'refused'; message: string }
	| { kind: 'block'; values: number[]; faults: string[]; message: string };

const many = new Intl.NumberFormat('en');

/**
 * What a paste into the grid means: values that are readings, and texts that are not and stay to be mended.
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
	const values: number[] = [];
	const faults: string[] = [];
	for (const cell of cells) {
		const parsed = parseReading(cell, mark);
		if (parsed.ok) values.push(parsed.value);
		else faults.push(cell);
	}
	const entered = values.length === 1 ? '1 reading entered' : `${values.length} readings entered`;
	const left =
		faults.length === 1
			? '1 cell is not a reading and waits below to be mended'
			: `${faults.length} cells are not readings and wait below to be mended`;
	return {
		kind: 'block',
		values,
		faults,
		message: faults.length > 0 ? `${entered}; ${left}.` : `${entered}.`
	};
}
