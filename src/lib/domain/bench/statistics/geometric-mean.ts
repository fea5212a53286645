import { logAverage } from 'simple-statistics';

/**
 * Geometric mean of ratios, the average whose ranking does not depend on the reference
 * (Fleming & Wallace 1986). RangeError for an empty list or a ratio that is not above zero.
 * @example geometricMean([60, 30, 120]) // 60
 */
export function geometricMean(ratios: readonly number[]): number {
	if (ratios.length === 0) throw new RangeError('A geometric mean needs at least one ratio.');
	if (!ratios.every((ratio) => ratio > 0 && Number.isFinite(ratio))) {
		throw new RangeError('A geometric mean needs ratios above zero.');
	}
	return logAverage([...ratios]);
}
