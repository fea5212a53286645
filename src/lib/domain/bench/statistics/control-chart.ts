import { type ControlLimits, controlLimits, movingRanges } from './control-limits';
import { ewma, type EwmaPoint } from './ewma';

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

export interface ChartPoint extends EwmaPoint {
	value: number;
	/** Distance from the reading before; for the first, from the last of the baseline. */
	movingRange: number;
	signals: Signal[];
}

export interface ControlChart {
	limits: ControlLimits;
	points: ChartPoint[];
}

/** Readings in a row on one side of the centre that make a signal (Western Electric's fourth rule). */
const longRun = 8;

/** How many in a row, up to each reading, lie on its side of the centre; above counts up, below down. */
function runs(values: readonly number[], centre: number): number[] {
	let run = 0;
	return values.map((value) => {
		const sign = Math.sign(value - centre);
		run = sign === 0 ? 0 : sign * run > 0 ? run + sign : sign;
		return run;
	});
}

/**
 * An individuals chart with moving ranges and an exponentially weighted average: the readings that followed a
 * baseline window, each with the signals it raises. A signal asks for a look at what changed; it proves nothing.
 * RangeError as `controlLimits` and `ewma`.
 * Source: NIST/SEMATECH e-Handbook §6.3.2.2 and §6.3.2.4; Western Electric rules in §6.3.2.
 * @param baseline in the order taken; twenty or more make steady limits (common practice, no source)
 */
export function controlChart(
	baseline: readonly number[],
	values: readonly number[],
	{ lambda = 0.2, width = 2.7 }: { lambda?: number; width?: number } = {}
): ControlChart {
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const limits = controlLimits(baseline);
	const averages = ewma(values, limits, lambda, width);
	const ranges = movingRanges([...baseline.slice(-1), ...values]);
	const inRow = runs(values, limits.centre);
	const points = averages.map((average, index): ChartPoint => {
		const value = values[index] ?? Number.NaN;
		const movingRange = ranges[index] ?? 0;
		const run = inRow[index] ?? 0;
		const raised: Record<Signal, boolean> = {
			'above-limit': value > limits.upper,
			'below-limit': value < limits.lower,
			jump: movingRange > limits.upperMovingRange,
			'average-above': average.ewma > average.upper,
			'average-below': average.ewma < average.lower,
			'run-above': run >= longRun,
			'run-below': run <= -longRun
		};
		return { ...average, value, movingRange, signals: signals.filter((signal) => raised[signal]) };
	});
	return { limits, points };
}
