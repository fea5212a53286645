import { decimalMarkOf, parseBlock, parseReading } from '../../../domain/bench/numbers';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { readingsPerRun, type PlainRun } from '../../../schemas/run';
import type { Context } from '../../context';
import { readAmbient } from './read-started';
import { recordGridReadings, type GridAnswer } from './record-grid-readings';

/** The numbers of a written list, one a line or one a cell; refused whole when one of them is not a number. */
export function readList(text: string): Outcome<number[], 'invalid'> {
	const fail = (messages: string[]) =>
		refuse('invalid', 'Nothing was stored: mend the readings and send them again.', {
			fields: { readings: messages }
		});
	const block = parseBlock(text);
	if (!block.ok) return fail([block.message]);
	const cells = block.rows.flat().filter((cell) => cell !== '');
	if (cells.length > readingsPerRun) return fail([`A run has at most ${readingsPerRun} readings.`]);
	const mark = decimalMarkOf(cells);
	const parsed = cells.map((cell) => parseReading(cell, mark));
	const faults = parsed.flatMap((one, at) => (one.ok ? [] : [`Reading ${at + 1}: ${one.message}`]));
	if (faults.length > 0) return fail(faults.slice(0, 5));
	return done(parsed.flatMap((one) => (one.ok ? [one.value] : [])));
}

/** Records a run from the plain form, the way without scripts; sent again, it is stored once. */
export async function recordPlainRun(
	ctx: Context,
	campaignRef: string,
	input: PlainRun
): Promise<Outcome<GridAnswer>> {
	const list = readList(input.readings);
	if (!list.ok) return list;
	const ambientC = readAmbient(input.ambient);
	if (!ambientC.ok) return ambientC;
	return recordGridReadings(ctx, campaignRef, {
		workload: input.workload,
		profile: input.profile,
		unit: input.unit,
		runKey: input.runKey,
		notes: input.notes,
		started: input.started,
		startedAt: null,
		// Without scripts nothing can be held and asked about: it is stored, and shows.
		othersSeen: null,
		ambientC: ambientC.value,
		readings: list.value.map((value, at) => ({ key: `${input.runKey}-${at}`, value }))
	});
}
