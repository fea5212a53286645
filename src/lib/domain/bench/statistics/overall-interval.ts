import type { Direction } from '../words';
import { geometricMean } from './geometric-mean';
import { studentQuantile } from './interval';
import type { Spread } from './sides';

/** One workload of the overall figure: both sides of its ratio. */
export interface OverallInput {
	subject: Spread;
	baseline: Spread;
	better: Direction;
}

export interface OverallInterval {
	/** Geometric mean of the ratios, turned so that above 1 is better. */
	ratio: number;
	/** 95 % interval; null where a side has a single reading or a mean is not clear of zero. */
	ci95: [number, number] | null;
	/** Welch–Satterthwaite; null where there is no interval, or nothing varies. */
	df: number | null;
}

/** Weight of each side in the logarithm of the mean. A side that enters twice (the same object) is one side. */
function weightsOf(inputs: readonly OverallInput[]): Map<Spread, number> {
	const weights = new Map<Spread, number>();
	for (const { subject, baseline, better } of inputs) {
		const share = (better === 'higher' ? 1 : -1) / inputs.length;
		weights.set(subject, (weights.get(subject) ?? 0) + share);
		weights.set(baseline, (weights.get(baseline) ?? 0) - share);
	}
	return weights;
}

/** Whether a mean's 95 % interval ends above zero, without which its logarithm has no such variance (as Fieller's g). */
const clearOfZero = (relativeVariance: number, n: number): boolean =>
	// Below this not even a single degree of freedom (t 12.7) reaches zero, and the quantile can be spared.
	relativeVariance < 0.006 || studentQuantile(0.975, n - 1) ** 2 * relativeVariance < 1;

/**
 * Geometric mean of a profile's ratios with its 95 % interval: delta method on the logarithms, so that a mean's
 * relative variance s² / (n x̄²) is that of its logarithm; variances of independent sides add with their squared
 * weights, and a baseline that several ratios share is weighted once for all of them. Student's t at
 * Welch–Satterthwaite degrees of freedom. It speaks of these workloads, not of others like them.
 * To hold two profiles against each other give the one as subject and the other as baseline: what they were both held
 * against drops out. Null for no workload. RangeError for a mean that is not above zero.
 */
export function overallInterval(inputs: readonly OverallInput[]): OverallInterval | null {
	if (inputs.length === 0) return null;
	const ratio = geometricMean(
		inputs.map(({ subject, baseline, better }) =>
			better === 'higher' ? subject.mean / baseline.mean : baseline.mean / subject.mean
		)
	);
	let variance = 0;
	let squares = 0;
	for (const [{ n, mean, sd }, weight] of weightsOf(inputs)) {
		if (weight === 0) continue;
		if (!(mean > 0)) throw new RangeError('A ratio needs means above zero.');
		if (sd === null) return { ratio, ci95: null, df: null };
		const relative = sd ** 2 / n / mean ** 2;
		if (!clearOfZero(relative, n)) return { ratio, ci95: null, df: null };
		const term = weight ** 2 * relative;
		variance += term;
		squares += term ** 2 / (n - 1);
	}
	if (variance === 0) return { ratio, ci95: [ratio, ratio], df: null };
	const df = variance ** 2 / squares;
	const factor = Math.exp(studentQuantile(0.975, df) * Math.sqrt(variance));
	return { ratio, ci95: [ratio / factor, ratio * factor], df };
}
