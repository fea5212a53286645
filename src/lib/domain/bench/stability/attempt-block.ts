import { parseBlock } from '../numbers';
import type { AttemptOutcome } from './words';

/** The columns of a block of attempts, in their order. */
export const attemptColumns = [
	'clockMHz',
	'volts',
	'stress',
	'durationMin',
	'outcome',
	'failure',
	'errors',
	'peakTempC',
	'packageW'
] as const;
export type AttemptColumn = (typeof attemptColumns)[number];

/** How an outcome is written in other people's sheets; common practice, no source. */
const outcomes: Record<string, AttemptOutcome> = {
	passed: 'passed',
	pass: 'passed',
	ok: 'passed',
	stable: 'passed',
	failed: 'failed',
	fail: 'failed',
	crash: 'failed',
	unstable: 'failed',
	stopped: 'stopped',
	stop: 'stopped'
};

export type AttemptBlock =
	{ ok: true; rows: Record<AttemptColumn, string>[] } | { ok: false; message: string };

/** A heading stands where no number does, in the first cell and in the one beside it. */
const isHeading = ([first = '', second = '']: string[]): boolean =>
	first !== '' && !/\d/.test(first) && !/\d/.test(second);

/**
 * A block pasted from a spreadsheet as rows of the grid: clock, volts, stress, minutes, outcome, failure, errors, °C, W.
 * A line of headings is left out; stresses may stand by name; cells that say nothing take what is given for them.
 * Nothing is judged here: what is not a number stays as it is, to be mended in its place.
 * @example attemptBlock('4900\t1.25\tLong sums\t30\tpass', given)
 */
export function attemptBlock(
	text: string,
	given: { stresses: readonly { slug: string; name: string }[]; stress: string }
): AttemptBlock {
	const block = parseBlock(text);
	if (!block.ok) return block;
	const [first, ...others] = block.rows;
	const lines = first && isHeading(first) ? others : block.rows;
	const slugOf = (written: string) =>
		given.stresses.find(({ slug, name }) => [slug, name.toLowerCase()].includes(written.toLowerCase()))
			?.slug ?? written;
	const rows = lines
		.filter((cells) => cells.some((cell) => cell !== ''))
		.map((cells) => {
			const cellOf = (column: AttemptColumn) => cells[attemptColumns.indexOf(column)] ?? '';
			const outcome = cellOf('outcome');
			return {
				...(Object.fromEntries(attemptColumns.map((column) => [column, cellOf(column)])) as Record<
					AttemptColumn,
					string
				>),
				stress: cellOf('stress') === '' ? given.stress : slugOf(cellOf('stress')),
				outcome: outcomes[outcome.toLowerCase()] ?? (outcome === '' ? 'passed' : outcome)
			};
		});
	return rows.length > 0
		? { ok: true, rows }
		: { ok: false, message: 'There is nothing in what was pasted.' };
}
