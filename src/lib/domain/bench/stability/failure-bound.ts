import { bisect } from 'simple-statistics';
import { printed, printedWithUnit } from '../../shared/quantity';

/** P(at most k events) for a Poisson mean, summed from the largest term down so that it never underflows early. */
function poissonAtMost(k: number, mean: number): number {
	let logTerm = -mean;
	for (let i = 1; i <= k; i += 1) logTerm += Math.log(mean / i);
	let share = 1;
	let shares = 1;
	for (let i = k; i > 0 && share > 1e-18; i -= 1) {
		share *= i / mean;
		shares += share;
	}
	return Math.exp(logTerm) * shares;
}

/**
 * Exact upper bound on the mean of a Poisson count that came out as k: the mean at which k or fewer have the
 * probability 1 − level, the same as χ²(level; 2(k + 1)) / 2; −ln(1 − level) for none, the exact form of the rule of
 * three. Source: Garwood 1936, Biometrika 28, 437–442. Found by bisection, since none of our libraries has the
 * quantile of χ². RangeError for a count that is not whole from 0 to 10,000, or a level outside 0 to 1.
 * @example poissonUpper(0) // 2.9957…
 */
export function poissonUpper(k: number, level = 0.95): number {
	if (!Number.isInteger(k) || k < 0 || k > 10_000)
		throw new RangeError('A count of failures is a whole number from 0 to 10,000.');
	if (!(level > 0 && level < 1)) throw new RangeError('A level lies between 0 and 1.');
	if (k === 0) return -Math.log1p(-level);
	let high = k + 1;
	while (poissonAtMost(k, high) > 1 - level) high *= 2;
	return bisect((mean) => poissonAtMost(k, mean) - (1 - level), 1e-9, high, 200, high * 1e-14);
}

export interface FailureBound {
	hours: number;
	failures: number;
	/** With 95 % confidence failures come at a lower rate than this. */
	perHour: number;
	/** The same as hours for each failure: they come less often. */
	hoursPerFailure: number;
	/** What the record does and does not prove. */
	words: string;
}

const duration = (hours: number): string =>
	hours < 1
		? printedWithUnit(Number((hours * 60).toPrecision(2)), 'min')
		: printedWithUnit(Number(hours.toPrecision(hours < 100 ? 2 : 3)), 'h');

const recordWords = (failures: number): string =>
	failures === 0
		? 'without a failure'
		: `with ${failures === 1 ? '1 failure' : `${printed(failures)} failures`}`;

/**
 * What so many hours with so many failures prove: the exact 95 % upper bound on the rate of failure, one-sided, for
 * failures that come by chance at a steady rate (heat that builds up, or ageing, is not that).
 * RangeError for hours that are not above zero or a count that is not whole.
 * @example failureBound(14, 0).words
 * // '14 h without a failure: with 95 % confidence fewer than one failure in 4.7 h. It does not prove that there is none.'
 */
export function failureBound(hours: number, failures: number): FailureBound {
	if (!(hours > 0 && Number.isFinite(hours))) throw new RangeError('The hours must be above zero.');
	const perHour = poissonUpper(failures) / hours;
	const proof = failures === 0 ? ' It does not prove that there is none.' : '';
	return {
		hours,
		failures,
		perHour,
		hoursPerFailure: 1 / perHour,
		words: `${printedWithUnit(hours, 'h', { decimals: hours < 10 && !Number.isInteger(hours) ? 1 : 0 })} ${recordWords(failures)}: with 95 % confidence fewer than one failure in ${duration(1 / perHour)}.${proof}`
	};
}
