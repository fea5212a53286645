import type { Step } from './steps';

export interface StepTotals {
	steps: number;
	/** Steps that set something, and those of them that differ from stock. */
	settings: number;
	changed: number;
	cautions: number;
	/** Lines a printed list of them takes: one a step, one more for a note, two for a caution. */
	lines: number;
}

/** How much a list of steps asks of the reader, and how long it is in print. */
export function stepTotals(steps: readonly Step[]): StepTotals {
	const set = steps.filter((step) => step.kind === 'set');
	const cautions = set.filter((step) => step.caution !== null).length;
	return {
		steps: steps.length,
		settings: set.length,
		changed: set.filter((step) => step.changed).length,
		cautions,
		lines: steps.length + set.filter((step) => step.note !== '').length + 2 * cautions
	};
}
