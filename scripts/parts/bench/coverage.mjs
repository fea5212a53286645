// How often the 95 % intervals hold the truth, over 20,000 simulated campaigns from fixed seeds. The control is the
// level they name. Met: 94 to 96 %, give or take three Monte-Carlo errors, or a warning on the screen that says so.
import { withDomain } from './domain.mjs';

const campaigns = 20_000;
const sizes = [3, 5, 10];

/** @param {(figure: import('./figure.mjs').Figure) => void} print */
export const measureCoverage = (print) =>
	withDomain(async (load) => {
		const { coverageOf } = await load('statistics/coverage.fixture.ts');
		const { coverageWarning, intervalMethods } = await load('statistics/coverage-warning.ts');
		for (const method of intervalMethods) {
			for (const n of sizes) {
				const { coverage, error } = coverageOf(method, n, campaigns, 20261201 + n);
				const kept = coverage > 0.94 - 3 * error && coverage < 0.96 + 3 * error;
				const warned = coverageWarning(method, n) !== null;
				print({
					name: `coverage.${method}.n${n}`,
					value: coverage,
					control: 0.95,
					goal: warned ? `0.94-0.96 or warned; ±${error.toFixed(4)}` : `0.94-0.96; ±${error.toFixed(4)}`,
					met: kept || warned
				});
			}
		}
	});
