import { mean, sampleVariance } from 'simple-statistics';
import type { Summary } from '../figures';

/** What a comparison of means needs of a set of readings. Unit: that of the readings. */
export type Spread = Pick<Summary, 'n' | 'mean' | 'sd'>;

/** Mean, variance of the mean and degrees of freedom of one side. */
export interface Side {
	mean: number;
	/** s² / n; null for a single reading. */
	varianceOfMean: number | null;
	df: number;
}

export const side = ({ n, mean: centre, sd }: Spread): Side => ({
	mean: centre,
	varianceOfMean: sd === null ? null : sd ** 2 / n,
	df: n - 1
});

/** Count, mean and sample deviation of readings. RangeError for none, or one that is not finite. */
export function spread(values: readonly number[]): Spread {
	if (values.length === 0) throw new RangeError('A comparison needs readings on both sides.');
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const list = [...values];
	return {
		n: list.length,
		mean: mean(list),
		sd: list.length > 1 ? Math.sqrt(sampleVariance(list)) : null
	};
}

/**
 * Degrees of freedom of a sum of two variances of means, not both zero (Welch–Satterthwaite), in shares of the
 * larger, so that very small or large units neither vanish nor overflow when squared.
 */
export function satterthwaite(a: number, dfA: number, b: number, dfB: number): number {
	const larger = Math.max(a, b);
	const [shareA, shareB] = [a / larger, b / larger];
	return (shareA + shareB) ** 2 / (shareA ** 2 / dfA + shareB ** 2 / dfB);
}
