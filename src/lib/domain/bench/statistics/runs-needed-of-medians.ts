import type { Direction } from '../words';
import { normalQuantile, normalUpperTail } from './normal';
import { expectedMedianError, type MedianSpread } from './robust';
import { mostPerSide, type Question, type RunsNeeded, settle, smallest, wantedPower } from './runs-needed';

/** `logMedianError` of a set, as `MedianSpread`, with its count. */
export interface CountedMedian extends MedianSpread {
	n: number;
}

/**
 * Expected error by number of readings from 2 on, each at least that of every larger number: the ranks it is taken
 * from jump, so it does not fall at every step by itself.
 */
const expectedErrors = (() => {
	let known: number[] | null = null;
	return (): readonly number[] => {
		if (known) return known;
		const list = Array.from({ length: mostPerSide - 1 }, (_, at) => expectedMedianError(at + 2));
		for (let at = list.length - 2; at >= 0; at -= 1) list[at] = Math.max(list[at] ?? 0, list[at + 1] ?? 0);
		known = list;
		return known;
	};
})();

/** Scatter of one reading that an error of a median stands for. */
const scatterOf = (logError: number, n: number): number => logError / expectedMedianError(n);

/**
 * How many readings would settle a comparison of medians that says *not enough runs*, if medians and scatter stay what
 * they are; power 0.8. The test is Price and Bonett's on the logarithms, as `testMedians` runs it; each side's error is
 * scaled from its own number of readings to the one asked for as it goes for normal readings (`expectedMedianError`: by
 * √n for many, by what the estimate comes to for few). Readings with a long tail settle it a little less often.
 * Unknown where a side has a single reading or neither varies.
 * @param leastDifferencePercent m, in percent
 * @param together comparisons read together, as for means
 */
export function runsNeededOfMedians(
	subject: CountedMedian,
	baseline: CountedMedian,
	better: Direction,
	leastDifferencePercent: number,
	together = 1
): RunsNeeded {
	if (subject.logError === null || baseline.logError === null) return { kind: 'unknown' };
	if (!(subject.median > 0 && baseline.median > 0)) return { kind: 'unknown' };
	const scatter = Math.hypot(
		scatterOf(subject.logError, subject.n),
		scatterOf(baseline.logError, baseline.n)
	);
	if (scatter === 0) return { kind: 'unknown' };
	const gain = Math.log(subject.median / baseline.median);
	const margin = Math.log1p(leastDifferencePercent / 100);
	const perSide: Question['perSide'] = (distances, alpha) => {
		const critical = normalQuantile(1 - alpha);
		const errors = expectedErrors();
		return smallest(mostPerSide, (n) => {
			const se = scatter * (errors[n - 2] ?? Infinity);
			const missed = distances.reduce((sum, distance) => sum + normalUpperTail(distance / se - critical), 0);
			return 1 - missed >= wantedPower;
		});
	};
	return settle({
		subject,
		baseline,
		estimate: better === 'higher' ? gain : -gain,
		margins: [-margin, margin],
		together,
		perSide
	});
}
