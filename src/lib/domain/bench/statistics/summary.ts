import { max, mean, median, min, sampleVariance } from 'simple-statistics';
import type { Summary } from '../figures';
import type { Headline } from '../words';
import { meanInterval } from './interval';
import { flagOutliers } from './outliers';
import { logMedianError } from './robust';

/**
 * What a set of readings says of itself, in the unit of the readings. The mean is summed with compensation
 * and the deviations are taken in a second pass, so that large offsets cost no digits.
 * RangeError for an empty set or a reading that is not finite.
 * @example summarise([38.9, 37.4, 37.1]).ci95 // [35.404…, 40.195…]
 */
export function summarise(values: readonly number[], headline: Headline = 'mean'): Summary {
	if (values.length === 0) throw new RangeError('A summary needs at least one reading.');
	if (!values.every(Number.isFinite)) throw new RangeError('Every reading must be a finite number.');
	const list = [...values];
	const average = mean(list);
	const middle = median(list);
	const sd = list.length > 1 ? Math.sqrt(sampleVariance(list)) : null;
	return {
		n: list.length,
		mean: average,
		median: middle,
		min: min(list),
		max: max(list),
		sd,
		cvPercent: sd !== null && average > 0 ? (100 * sd) / average : null,
		ci95: sd === null ? null : meanInterval(average, sd, list.length),
		flagged: flagOutliers(list),
		headline: headline === 'median' ? middle : average,
		medianLogError: list.length > 1000 ? null : logMedianError(list)
	};
}
