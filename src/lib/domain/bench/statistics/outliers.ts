import { mean, median, sampleStandardDeviation } from 'simple-statistics';
import { studentQuantile } from './interval';

/** Below this many readings no reading is called far off: the tests can hardly speak there (common practice, no source). */
const fewestForOutliers = 6;

/** From here on more than one far reading is looked for; below, Rosner's approximation is not good enough. */
const fewestForSeveral = 15;

/** Whether a set of this size is looked through for outliers at all; the page says so where it is not. */
export const canFlagOutliers = (n: number): boolean => n >= fewestForOutliers;

/**
 * Two-sided critical value of Grubbs' G, which is also the first critical value of the generalised ESD test.
 * Source: NIST/SEMATECH e-Handbook §1.3.5.17.1.
 * @example grubbsCritical(8) // 2.1266…
 */
export function grubbsCritical(n: number, alpha = 0.05): number {
	if (n < 3) throw new RangeError("Grubbs' test needs three readings or more.");
	const t = studentQuantile(1 - alpha / (2 * n), n - 2);
	return ((n - 1) / Math.sqrt(n)) * Math.sqrt((t * t) / (n - 2 + t * t));
}

export interface EsdStep {
	/** Index into the readings given. */
	index: number;
	/** Distance from the mean of what is left, in its standard deviations. */
	statistic: number;
	critical: number;
}

/**
 * The steps of the generalised extreme studentised deviate test (Rosner 1983; e-Handbook §1.3.5.17.3):
 * at each, the reading farthest from the mean of what is left. Ends early where what is left does not vary.
 */
export function esdSteps(values: readonly number[], most: number, alpha = 0.05): EsdStep[] {
	const left = values.map((value, index) => ({ value, index }));
	const steps: EsdStep[] = [];
	while (steps.length < most && left.length >= 3) {
		const kept = left.map((item) => item.value);
		const sd = sampleStandardDeviation(kept);
		if (!(sd > 0)) break;
		const centre = mean(kept);
		let farthest = 0;
		for (let i = 1; i < kept.length; i += 1) {
			if (Math.abs((kept[i] ?? 0) - centre) > Math.abs((kept[farthest] ?? 0) - centre)) farthest = i;
		}
		const [gone] = left.splice(farthest, 1);
		if (!gone) break;
		steps.push({
			index: gone.index,
			statistic: Math.abs(gone.value - centre) / sd,
			critical: grubbsCritical(kept.length, alpha)
		});
	}
	return steps;
}

/** Outliers of the generalised ESD test, `most` at the highest: indices into the readings, ascending. */
export function generalisedEsd(values: readonly number[], most: number, alpha = 0.05): number[] {
	const steps = esdSteps(values, most, alpha);
	const last = steps.findLastIndex((step) => step.statistic > step.critical);
	return steps
		.slice(0, last + 1)
		.map((step) => step.index)
		.sort((a, b) => a - b);
}

/**
 * Indices of readings that stand far from the others; a flag for a person to look at, never a removal.
 * Silent below six readings; Grubbs' two-sided test at 0.05 below fifteen; from there the generalised
 * ESD test for up to a fifth of the readings, ten at most.
 */
export function flagOutliers(values: readonly number[]): number[] {
	const n = values.length;
	if (!canFlagOutliers(n)) return [];
	return generalisedEsd(values, n < fewestForSeveral ? 1 : Math.min(10, Math.floor(n / 5)));
}

/**
 * Modified z-scores 0.6745 (x − median) / MAD (Iglewicz & Hoaglin 1993, in e-Handbook §1.3.5.17; above 3.5
 * in size is a possible outlier). Null where more than half the readings are the same, so that MAD is zero.
 */
export function modifiedZScores(values: readonly number[]): number[] | null {
	if (values.length === 0) return null;
	const centre = median([...values]);
	const mad = median(values.map((value) => Math.abs(value - centre)));
	return mad > 0 ? values.map((value) => (0.6745 * (value - centre)) / mad) : null;
}
