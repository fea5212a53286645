import type { Direction } from '../words';
import { studentQuantile, upperTailP } from './interval';
import { satterthwaite, type Spread } from './sides';

/** Beyond this many readings a side nobody goes on (common practice, no source). */
export const mostPerSide = 200;
/** Share of campaigns that the readings asked for are to settle. */
export const wantedPower = 0.8;

export type RunsNeeded =
	| {
			kind: 'runs';
			/** What the present figures point to. */
			outcome: 'difference' | 'equivalence';
			/** Readings a side that would settle it in four of five campaigns. */
			perSide: number;
			moreOfSubject: number;
			moreOfBaseline: number;
	  }
	| { kind: 'too-near' }
	| { kind: 'unknown' };

/**
 * Chance that every one of the one-sided tests rejects, by shifting Student's t (the usual iteration between quantile
 * and degrees of freedom; a little cautious against the non-central t). Bonferroni's bound where there are two.
 */
function chance(distances: readonly number[], se: number, df: number, alpha: number): number {
	const critical = studentQuantile(1 - alpha, df);
	return 1 - distances.reduce((sum, distance) => sum + upperTailP(distance / se - critical, df), 0);
}

/** Smallest whole number from 2 on for which `enough` holds, given that it holds for all above; null beyond `most`. */
export function smallest(most: number, enough: (n: number) => boolean): number | null {
	if (!enough(most)) return null;
	let [low, high] = [2, most];
	while (low < high) {
		const middle = Math.floor((low + high) / 2);
		if (enough(middle)) high = middle;
		else low = middle + 1;
	}
	return low;
}

/**
 * Readings a side for `chance` to reach a power, where both sides have as many.
 * @param sds standard deviations of one reading of each side, as they enter the test
 * @param distances from the estimate to each margin that a one-sided test must exclude, all above zero
 * @param alpha one-sided
 */
export function readingsPerSide(
	sds: readonly [number, number],
	distances: readonly number[],
	alpha: number,
	wanted = wantedPower,
	most = mostPerSide
): number | null {
	const [a, b] = [sds[0] ** 2, sds[1] ** 2];
	return smallest(most, (n) => {
		const df = satterthwaite(a, n - 1, b, n - 1);
		return chance(distances, Math.sqrt((a + b) / n), df, alpha) >= wanted;
	});
}

export interface Question {
	subject: Pick<Spread, 'n'>;
	baseline: Pick<Spread, 'n'>;
	estimate: number;
	margins: readonly [number, number];
	together: number;
	/** Readings a side that would tell the estimate from margins so far off at that one-sided level; null beyond the most. */
	perSide: (distances: readonly number[], alpha: number) => number | null;
}

/** What of its margins a comparison must exclude: both from within, the nearer one from beyond. */
function testedMargins(estimate: number, [lower, upper]: readonly [number, number]): readonly number[] {
	if (estimate > lower && estimate < upper) return [lower, upper];
	return [estimate >= upper ? upper : lower];
}

/** What would settle a comparison that says *not enough runs*, whichever average it is of. */
export function settle(question: Question): RunsNeeded {
	const { subject, baseline, estimate, margins, together } = question;
	const tested = testedMargins(estimate, margins);
	const inside = tested.length === 2;
	const distances = tested.map((margin) => Math.abs(estimate - margin));
	const perSide = distances.every((distance) => distance > 0)
		? question.perSide(distances, (inside ? 0.05 : 0.025) / together)
		: null;
	if (perSide === null) return { kind: 'too-near' };
	return {
		kind: 'runs',
		outcome: inside ? 'equivalence' : 'difference',
		perSide,
		moreOfSubject: Math.max(0, perSide - subject.n),
		moreOfBaseline: Math.max(0, perSide - baseline.n)
	};
}

/**
 * How many readings would settle a comparison of means that says *not enough runs*, if means and scatter stay what they are:
 * to show a difference beyond m, or equivalence within m, whichever the present ratio points to; power 0.8.
 * Unknown where a side has fewer than two readings, neither varies, or a mean is not above zero.
 * @param leastDifferencePercent m, in percent
 * @param together comparisons read together: each must then hold at that share of the level (Bonferroni's bound on Holm)
 */
export function runsNeeded(
	subject: Spread,
	baseline: Spread,
	better: Direction,
	leastDifferencePercent: number,
	together = 1
): RunsNeeded {
	const [top, bottom] = better === 'higher' ? [subject, baseline] : [baseline, subject];
	if (top.sd === null || bottom.sd === null || top.sd + bottom.sd === 0) return { kind: 'unknown' };
	if (!(top.mean > 0 && bottom.mean > 0)) return { kind: 'unknown' };
	const upper = 1 + leastDifferencePercent / 100;
	const margins = [1 / upper, upper] as const;
	const estimate = top.mean / bottom.mean;
	// In units of the bottom mean; the widest of the tested margins weighs the bottom side's scatter.
	const theta = Math.max(...testedMargins(estimate, margins));
	const sds = [top.sd / bottom.mean, (theta * bottom.sd) / bottom.mean] as const;
	const perSide: Question['perSide'] = (distances, alpha) => readingsPerSide(sds, distances, alpha);
	return settle({ subject, baseline, estimate, margins, together, perSide });
}

/** As `runsNeeded`, for a comparison by difference, against a least difference in the unit of the readings. */
export function runsNeededOfDifference(
	subject: Spread,
	baseline: Spread,
	leastDifference: number,
	together = 1
): RunsNeeded {
	if (subject.sd === null || baseline.sd === null || subject.sd + baseline.sd === 0)
		return { kind: 'unknown' };
	const sds = [subject.sd, baseline.sd] as const;
	return settle({
		subject,
		baseline,
		perSide: (distances, alpha) => readingsPerSide(sds, distances, alpha),
		estimate: subject.mean - baseline.mean,
		margins: [-leastDifference, leastDifference],
		together
	});
}

const readings = (n: number): string => `${n} more reading${n === 1 ? '' : 's'}`;

/** The answer in words, for the screen. */
export function runsNeededWords(needed: RunsNeeded): string {
	if (needed.kind === 'unknown') return 'Take two readings or more on each side first.';
	if (needed.kind === 'too-near') {
		return `More than ${mostPerSide} readings a side would not settle it: the two lie too near the edge of what matters.`;
	}
	const { outcome, moreOfSubject, moreOfBaseline } = needed;
	const end = outcome === 'difference' ? 'show a difference that matters' : 'show that none matters';
	const parts = [
		...(moreOfSubject > 0 ? [`${readings(moreOfSubject)} here`] : []),
		...(moreOfBaseline > 0 ? [`${readings(moreOfBaseline)} of the baseline`] : [])
	];
	return parts.length > 0
		? `About ${parts.join(' and ')} would likely ${end}, if the scatter stays as it is.`
		: `One more reading on each side would likely ${end}.`;
}

/** The same in a few words, for the narrow cell of a table. */
export function runsNeededShort(needed: RunsNeeded): string {
	if (needed.kind === 'unknown') return 'two readings a side first';
	if (needed.kind === 'too-near') return `over ${mostPerSide} readings a side`;
	const { moreOfSubject: here, moreOfBaseline: there } = needed;
	const parts = [
		...(here > 0 ? [`${here} more here`] : []),
		...(there > 0 ? [`${there} more of the baseline`] : [])
	];
	return parts.length > 0 ? `about ${parts.join(', ')}` : 'about one more a side';
}
