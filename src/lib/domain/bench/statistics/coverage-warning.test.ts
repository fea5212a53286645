import { describe, expect, it } from 'vitest';
import { coverageOf } from './coverage.fixture';
import { coverageWarning, intervalMethods } from './coverage-warning';

describe('how often an interval holds the truth', () => {
	const cases = intervalMethods.flatMap((method) => [3, 5, 7, 10].map((n) => [method, n] as const));

	// From a fixed seed, so the same each time; wide by three Monte-Carlo errors of 2,000 campaigns.
	it.each(cases)('%s of %d readings: 94 to 96 %%, or words that it is not', (method, n) => {
		const { coverage, error } = coverageOf(method, n, 2000, 20261201 + n);
		if (coverageWarning(method, n) === null) {
			expect(coverage).toBeGreaterThan(0.94 - 3 * error);
			expect(coverage).toBeLessThan(0.96 + 3 * error);
		} else expect(Math.abs(coverage - 0.95)).toBeGreaterThan(0.01);
	});

	it('is the same from the same seed, with the error of a share', () => {
		const once = coverageOf('mean', 3, 400, 7);
		expect(coverageOf('mean', 3, 400, 7)).toEqual(once);
		expect(once.error).toBeCloseTo(Math.sqrt((once.coverage * (1 - once.coverage)) / 400), 12);
	});

	it('has words for too narrow and for too wide, and none where the interval keeps its level', () => {
		expect(coverageWarning('ratio-of-medians', 3)).toBe(
			'With 3 readings a side this interval holds the truth in 89 to 94 of 100 campaigns, not in 95. Take it as too narrow until there are more readings.'
		);
		expect(coverageWarning('ratio-of-medians', 7)).toContain('wider than it need be');
		expect(coverageWarning('mean', 2)).toBeNull();
	});
});
