import type { TakenReading } from './readings-import';

type Placed = Pick<TakenReading, 'profile' | 'workload' | 'run' | 'repeat' | 'voidedReason'>;

/**
 * Remembers the rows of a file. Each call says what is wrong with a row beside those before it, null where nothing is:
 * a repeat that its run, or its cell where runs are not numbered, has already; a run that is voided on one line only.
 */
export function seenRows(): (line: number, row: Placed) => string | null {
	const repeats = new Map<string, number>();
	const runs = new Map<string, { line: number; voidedReason: string }>();
	return (line, { profile, workload, run, repeat, voidedReason }) => {
		const key = `${profile}/${workload}/${run ?? ''}`;
		const of = run === null ? 'this cell' : `run ${run} of this cell`;
		const first = repeats.get(`${key}/${repeat}`);
		if (repeat !== null && first !== undefined)
			return `Repeat ${repeat} of ${of} is on line ${first} already.`;
		const begun = runs.get(key);
		if (begun && begun.voidedReason !== voidedReason)
			return `The reason why ${run === null ? 'the run' : `run ${run}`} is voided differs from that on line ${begun.line}; a run is voided as a whole.`;
		if (repeat !== null) repeats.set(`${key}/${repeat}`, line);
		if (!begun) runs.set(key, { line, voidedReason });
		return null;
	};
}
