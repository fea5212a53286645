// A whole table of comparisons, 12 profiles by 30 workloads by 10 readings, with Holm's correction over all of it. The
// control is the statistics library alone, asked for mean and sample deviation of the same readings.
import { mean, sampleStandardDeviation } from 'simple-statistics';
import { scatter, upTo } from '../fill/insert.mjs';
import { withDomain } from './domain.mjs';

const profiles = 12;
const workloads = 30;
const readings = 10;
const rounds = 15;

/** @param {() => unknown} work the least of several times: what else ran is left out */
const leastMs = (work) =>
	Math.min(
		...upTo(rounds).map(() => {
			const began = performance.now();
			work();
			return performance.now() - began;
		})
	);

/** @param {(figure: import('./figure.mjs').Figure) => void} print */
export const measureTable = (print) =>
	withDomain(async (load) => {
		const { compareMany } = await load('statistics/compare-many.ts');
		const { spread } = await load('statistics/sides.ts');
		const noise = scatter(1);
		const cells = upTo(profiles + 1).map((p) =>
			upTo(workloads).map((w) => upTo(readings).map(() => (20 + w) * (1 + 0.01 * p) * (1 + 0.01 * noise())))
		);
		const table = () => {
			const spreads = cells.map((row) => row.map((values) => spread(values)));
			const [baseline = [], ...subjects] = spreads;
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
		};
		const value = leastMs(table);
		const control = leastMs(() =>
			cells.flat().map((values) => [mean(values), sampleStandardDeviation(values)])
		);
		print({ name: 'statistics.table.ms', value, control, goal: '<30', met: value < 30 });
	});
