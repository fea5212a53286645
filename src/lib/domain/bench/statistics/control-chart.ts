import { type ControlLimits, controlLimits, movingRanges } from './control-limits';
import { ewmaFrom, type EwmaPoint } from './ewma';

export const signals = [
	'above-limit',
	'below-limit',
	'jump',
	'average-above',
	'average-below',
	'run-above',
	'run-below'
] as const;
export type Signal = (typeof signals)[number];

export const signalWords: Record<Signal, string> = {
	'above-limit': 'above the upper limit',
	'below-limit': 'below the lower limit',
	jump: 'farther from the one before than the limit of moving ranges',
	'average-above': 'weighted average above its limit: a slow rise',
	'average-below': 'weighted average below its limit: a slow fall',
	'run-above': 'eight in a row above the centre',
	'run-below': 'eight in a row below the centre'
};

/** The side of the centre on which a reading signals; 0 for a jump, which says none. */
const sides: Record<Signal, -1 | 0 | 1> = {
	'above-limit': 1,
	'below-limit': -1,
	jump: 0,
	'average-above': 1,
	'average-below': -1,
	'run-above': 1,
	'run-below': -1
};

export interface ChartPoint extends EwmaPoint {
	value: number;
	/** Distance from the reading before; for the first, from the last of the baseline. */
	movingRange: number;
	signals: Signal[];
	/** Why the weighted average begins anew at the centre with this reading; null where it goes on. */
	begun: Beginning | null;
}

export const beginningWords = {
	revision: 'average begun anew: the rig was revised',
	mended: 'average begun anew: back across the centre after a signal'
} as const;
export type Beginning = keyof typeof beginningWords;

export interface ControlChart {
	limits: ControlLimits;
	points: ChartPoint[];
}

/** Readings in a row on one side of the centre that make a signal (Western Electric's fourth rule). */
const longRun = 8;

/**
 * An individuals chart with moving ranges and an exponentially weighted average: the readings that followed a
 * baseline window, each with the signals it raises. A signal asks for a look at what changed; it proves nothing.
 *
 * The average remembers a shift for readings on end after it was mended, so it begins anew at the centre, with the
 * narrow limits of a beginning: with the first reading of a revised rig, and, after a signal, with the first reading
 * back at the centre or across it. That is common practice: charts with a memory are begun again at their target (as
 * one-sided EWMA charts are when they fall back to it: Symmetry 2022, 14, 159, introduction). The e-Handbook says in
 * §6.3.2.4 how an average begins, and nothing of beginning again. A revision also ends what was in a row.
 *
 * RangeError as `controlLimits` and `ewmaFrom`.
 * Source: NIST/SEMATECH e-Handbook §6.3.2.2 and §6.3.2.4; Western Electric rules in §6.3.2.
 * @param baseline in the order taken; twenty or more make steady limits (common practice, no source)
 * @param revised indices, into the values, of the first reading of each revision of the rig
 */
export function controlChart(
	baseline: readonly number[],
	values: readonly number[],
	{
		lambda = 0.2,
		width = 2.7,
		revised = new Set()
	}: { lambda?: number; width?: number; revised?: ReadonlySet<number> } = {}
): ControlChart {
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const limits = controlLimits(baseline);
	const step = ewmaFrom(limits, lambda, width);
	const ranges = movingRanges([...baseline.slice(-1), ...values]);
	/** In a row on one side of the centre up to here: above counts up, below down. */
	let run = 0;
	/** Side of the last signal since the average began. */
	let signalled = 0;
	const points = values.map((value, index): ChartPoint => {
		const side = Math.sign(value - limits.centre);
		const back = signalled !== 0 && side !== signalled;
		const begun: Beginning | null = revised.has(index) ? 'revision' : back ? 'mended' : null;
		if (begun !== null) signalled = 0;
		if (begun === 'revision') run = 0;
		run = side === 0 ? 0 : side * run > 0 ? run + side : side;
		const average = step(value, begun !== null);
		const movingRange = ranges[index] ?? 0;
		const raised: Record<Signal, boolean> = {
			'above-limit': value > limits.upper,
			'below-limit': value < limits.lower,
			jump: movingRange > limits.upperMovingRange,
			'average-above': average.ewma > average.upper,
			'average-below': average.ewma < average.lower,
			'run-above': run >= longRun,
			'run-below': run <= -longRun
		};
		const named = signals.filter((signal) => raised[signal]);
		signalled = Math.sign(named.reduce((sum, signal) => sum + sides[signal], 0)) || signalled;
		return { ...average, value, movingRange, signals: named, begun };
	});
	return { limits, points };
}
