/** d₂ and D₄ for ranges of two (Shewhart's factors; NIST/SEMATECH e-Handbook §6.3.2.1 and §6.3.2.2). */
const d2 = 1.128;
const d4 = 3.267;

/** Limits of an individuals chart with its moving ranges. Unit: that of the readings. */
export interface ControlLimits {
	centre: number;
	/** MR̄ / 1.128: the scatter from one reading to the next. */
	sigma: number;
	lower: number;
	upper: number;
	averageMovingRange: number;
	upperMovingRange: number;
}

/** Distances between neighbours, in the order the readings were taken. */
export const movingRanges = (values: readonly number[]): number[] =>
	values.slice(1).map((value, index) => Math.abs(value - (values[index] ?? value)));

/**
 * Limits from a window that is held to be in order: mean ± 3 MR̄/1.128 (2.66 MR̄), and 3.267 MR̄ for the ranges.
 * RangeError below two readings, for one that is not finite, or where nothing varies.
 * Source: NIST/SEMATECH e-Handbook §6.3.2.2.
 */
export function controlLimits(baseline: readonly number[]): ControlLimits {
	if (baseline.length < 2) throw new RangeError('A control chart needs two readings or more to begin with.');
	if (!baseline.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const averageOf = (values: readonly number[]) =>
		values.reduce((sum, value) => sum + value, 0) / values.length;
	const centre = averageOf(baseline);
	const averageMovingRange = averageOf(movingRanges(baseline));
	if (!(averageMovingRange > 0)) throw new RangeError('A control chart needs readings that vary.');
	const sigma = averageMovingRange / d2;
	return {
		centre,
		sigma,
		lower: centre - 3 * sigma,
		upper: centre + 3 * sigma,
		averageMovingRange,
		upperMovingRange: d4 * averageMovingRange
	};
}
