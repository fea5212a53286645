/** How often an interval holds the truth, by simulation from a seed: for the tests and for `npm run bench`. */
import { fieller } from './fieller';
import { meanInterval } from './interval';
import { overallInterval } from './overall-interval';
import { compareMedians } from './robust';
import { side, spread } from './sides';
import type { IntervalMethod } from './coverage-warning';

/** Numbers between 0 and 1 from a seed (mulberry32). */
export function uniformFrom(seed: number): () => number {
	let state = seed;
	return () => {
		state = (state + 0x6d2b79f5) | 0;
		let t = Math.imul(state ^ (state >>> 15), 1 | state);
		t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
		return (((t ^ (t >>> 14)) >>> 0) + 0.5) / 2 ** 32;
	};
}

/** Readings of a bench: normal, the scatter in shares of the mean (Box & Muller). */
export const readingsFrom =
	(uniform: () => number) =>
	(n: number, mean: number, cv: number): number[] =>
		Array.from(
			{ length: n },
			() => mean * (1 + cv * Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform()))
		);

type Readings = ReturnType<typeof readingsFrom>;

const truth = 1.05;
const workloads = 8;

const interval: Record<IntervalMethod, (readings: Readings, n: number) => [number, number] | null> = {
	mean: (readings, n) => {
		const { mean, sd } = spread(readings(n, truth, 0.03));
		return meanInterval(mean, sd ?? 0, n);
	},
	ratio: (readings, n) =>
		fieller(side(spread(readings(n, truth, 0.02))), side(spread(readings(n, 1, 0.04))), 0.95),
	overall: (readings, n) =>
		overallInterval(
			Array.from({ length: workloads }, (_, w) => ({
				subject: spread(readings(n, w % 2 ? truth : 1, 0.01 * (1 + (w % 4)))),
				baseline: spread(readings(n, w % 2 ? 1 : truth, 0.02)),
				better: w % 2 ? 'higher' : 'lower'
			}))
		)?.ci95 ?? null,
	'ratio-of-medians': (readings, n) =>
		compareMedians(readings(n, truth, 0.02), readings(n, 1, 0.04), 'higher', 1).comparison.ci95
};

/** Share of simulated campaigns whose 95 % interval holds the truth, with the Monte-Carlo error of that share. */
export function coverageOf(
	method: IntervalMethod,
	n: number,
	campaigns: number,
	seed: number
): { coverage: number; error: number } {
	const readings = readingsFrom(uniformFrom(seed));
	let holds = 0;
	for (let i = 0; i < campaigns; i += 1) {
		const found = interval[method](readings, n);
		if (found && found[0] <= truth && truth <= found[1]) holds += 1;
	}
	const coverage = holds / campaigns;
	return { coverage, error: Math.sqrt((coverage * (1 - coverage)) / campaigns) };
}
