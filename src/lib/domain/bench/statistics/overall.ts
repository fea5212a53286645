import type { Comparison, Overall } from '../figures';
import { geometricMean } from './geometric-mean';

/**
 * The overall figure of a profile: the geometric mean of its ratios, each workload counting once.
 * Null where no workload has a ratio.
 */
export function overall(
	comparisons: readonly { workload: string; comparison: Comparison | null }[]
): Overall | null {
	const ratios: number[] = [];
	const workloads: string[] = [];
	const missing: string[] = [];
	for (const { workload, comparison } of comparisons) {
		if (comparison) {
			ratios.push(comparison.ratio);
			workloads.push(workload);
		} else missing.push(workload);
	}
	if (ratios.length === 0) return null;
	const ratio = geometricMean(ratios);
	return { ratio, gainPercent: (ratio - 1) * 100, workloads, missing };
}
