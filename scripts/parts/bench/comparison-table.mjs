// What is measured of a whole table of comparisons, the same on the server and in the browser: it is bundled for the
// latter, so it imports nothing.

const warmUps = 10;

/**
 * A table of profiles held against the first of them, workload by workload, with Holm's correction over all of it.
 * @param {{ compareMany: (questions: object[]) => unknown, spread: (values: number[]) => object }} domain
 * @param {number[][][]} cells readings by profile and workload
 */
export function compareTable({ compareMany, spread }, cells) {
	const [baseline = [], ...subjects] = cells.map((row) => row.map((values) => spread(values)));
	return compareMany(
		subjects.flatMap((row) =>
			row.map((subject, w) => ({
				subject,
				baseline: baseline[w],
				better: w % 2 ? 'higher' : 'lower',
				leastDifferencePercent: 1
			}))
		)
	);
}

/**
 * The median of many times, in ms, after some that are not counted.
 * @param {() => unknown} work @param {number} rounds
 */
export function medianMs(work, rounds) {
	const times = Array.from({ length: warmUps + rounds }, () => {
		const began = performance.now();
		work();
		return performance.now() - began;
	}).slice(warmUps);
	return times.sort((a, b) => a - b)[Math.floor(rounds / 2)] ?? NaN;
}
