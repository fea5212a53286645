import type { Verdict } from '../figures';
import type { Direction } from '../words';
import { side, type Spread } from './sides';
import { type PValues, tost } from './tost';
import { verdictOf } from './verdict';
import { welchSides } from './welch';

/** A cell less its baseline, turned so that above zero is better. Unit: that of the readings (K where they are °C). */
export interface DifferenceComparison {
	difference: number;
	/** Welch's 95 % interval; null with a single reading on a side. */
	ci95: [number, number] | null;
	p: PValues | null;
	verdict: Verdict;
}

function certain(difference: number, least: number): DifferenceComparison {
	const p = {
		pDiffer: Math.abs(difference) > least ? 0 : 1,
		pEquivalent: Math.abs(difference) < least ? 0 : 1
	};
	return { difference, ci95: [difference, difference], p, verdict: verdictOf(p, difference > 0) };
}

/**
 * Two cells whose ratio means nothing, from their summaries: the difference of means with Welch's interval, and a
 * verdict against a least difference in the unit itself. *Better* or *worse*: the 95 % interval lies wholly beyond it.
 * *No difference*: the 90 % interval lies wholly inside (two one-sided tests, Schuirmann 1987).
 * RangeError for a least difference below zero, or figures that are not finite.
 * @example compareDifference({ n: 3, mean: 71, sd: 1 }, { n: 3, mean: 80, sd: 1 }, 'lower', 2).difference // 9
 */
export function compareDifference(
	subject: Spread,
	baseline: Spread,
	better: Direction,
	leastDifference: number
): DifferenceComparison {
	if (!(leastDifference >= 0))
		throw new RangeError('The least difference that matters cannot be below zero.');
	if (![subject.mean, baseline.mean].every(Number.isFinite))
		throw new RangeError('A difference needs finite means.');
	const turned = better === 'higher' ? ([subject, baseline] as const) : ([baseline, subject] as const);
	const [first, second] = [side(turned[0]), side(turned[1])];
	const difference = first.mean - second.mean;
	if (first.varianceOfMean === null || second.varianceOfMean === null) {
		return { difference, ci95: null, p: null, verdict: 'not-enough' };
	}
	if (first.varianceOfMean + second.varianceOfMean === 0) return certain(difference, leastDifference);
	const { ci, df, se } = welchSides(first, second);
	const p = tost((difference + leastDifference) / se, (difference - leastDifference) / se, df);
	return { difference, ci95: ci, p, verdict: verdictOf(p, difference > 0) };
}
