import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareSummaries } from './compare';
import { readingsPerSide, runsNeeded, runsNeededWords } from './runs-needed';

describe('readings a side', () => {
	it('R 4.2.2: power.t.test(power = .90, delta = 1) asks 22.02 two-sided, 17.85 one-sided', () => {
		expect(readingsPerSide([1, 1], [1], 0.025, 0.9)).toBe(23);
		expect(readingsPerSide([1, 1], [1], 0.05, 0.9)).toBe(18);
	});

	it('R 4.2.2: power.t.test(n = 20, delta = 1, sd = 1) has power 0.868952801692', () => {
		// The shifted t is a little cautious against R's non-central t: one reading at the most.
		expect(readingsPerSide([1, 1], [1], 0.025, 0.8689528)).toBeGreaterThanOrEqual(20);
		expect(readingsPerSide([1, 1], [1], 0.025, 0.8689528)).toBeLessThanOrEqual(21);
	});

	it('splits the risk over two margins: SciPy asks 155 a side', () => {
		// SciPy 1.17.1, exact power of two one-sided t tests at 0.05, equal means, margins σ/3, by integrating over the
		// pooled deviation (scipy.integrate.quad over stats.chi2): 0.797216 at 154 a side, 0.800564 at 155.
		const n = readingsPerSide([1, 1], [1 / 3, 1 / 3], 0.05, 0.8) ?? 0;
		expect(n).toBeGreaterThanOrEqual(155);
		expect(n).toBeLessThanOrEqual(157);
	});
});

describe('how many more readings would settle it', () => {
	const of = (mean: number, sd: number, n = 5) => ({ n, mean, sd });

	it('a difference', () => {
		const needed = runsNeeded(of(103, 3), of(100, 3), 'higher', 1);
		expect(needed).toMatchObject({ kind: 'runs', outcome: 'difference' });
		if (needed.kind !== 'runs') return;
		expect(needed.moreOfSubject).toBe(needed.perSide - 5);
		// With as many readings and the same figures the verdict stands.
		const later = [of(103, 3, needed.perSide), of(100, 3, needed.perSide)] as const;
		expect(compareSummaries(of(103, 3), of(100, 3), 'higher', 1).verdict).toBe('not-enough');
		expect(compareSummaries(...later, 'higher', 1).verdict).toBe('better');
		expect(runsNeededWords(needed)).toBe(
			`About ${needed.moreOfSubject} more readings here and ${needed.moreOfBaseline} more readings of the baseline would likely show a difference that matters, if the scatter stays as it is.`
		);
	});

	it('no difference', () => {
		const needed = runsNeeded(of(100, 2), of(100, 2), 'lower', 2);
		expect(needed).toMatchObject({ kind: 'runs', outcome: 'equivalence' });
		if (needed.kind !== 'runs') return;
		const side = of(100, 2, needed.perSide);
		expect(compareSummaries(side, side, 'lower', 2).verdict).toBe('no-difference');
	});

	it('gives up where the two lie on the edge', () => {
		const needed = runsNeeded(of(102.01, 3), of(100, 3), 'higher', 2);
		expect(needed).toEqual({ kind: 'too-near' });
		expect(runsNeeded(of(102, 3), of(100, 3), 'higher', 2)).toEqual({ kind: 'too-near' });
		expect(runsNeededWords(needed)).toContain('too near the edge');
	});

	it('cannot tell from a single reading, from nothing that varies, or without a ratio', () => {
		expect(runsNeeded({ n: 1, mean: 5, sd: null }, of(5, 1), 'higher', 1)).toEqual({ kind: 'unknown' });
		expect(runsNeeded(of(5, 0), of(5, 0), 'higher', 1)).toEqual({ kind: 'unknown' });
		expect(runsNeeded(of(-5, 1), of(5, 1), 'higher', 1)).toEqual({ kind: 'unknown' });
		expect(runsNeededWords({ kind: 'unknown' })).toBe('Take two readings or more on each side first.');
	});

	it('asks for no fewer where the scatter is wider, and does not mind the unit', () => {
		const sd = fc.double({ min: 0.2, max: 4, noNaN: true });
		fc.assert(
			fc.property(sd, sd, fc.double({ min: 90, max: 110, noNaN: true }), (narrow, more, mean) => {
				const perSide = (scatter: number, unit = 1) => {
					const needed = runsNeeded(
						of(mean * unit, scatter * unit),
						of(100 * unit, scatter * unit),
						'higher',
						2
					);
					return needed.kind === 'runs' ? needed.perSide : Infinity;
				};
				expect(perSide(narrow + more)).toBeGreaterThanOrEqual(perSide(narrow));
				expect(Math.abs(perSide(narrow, 1024) - perSide(narrow)) || 0).toBe(0);
			})
		);
	});
});
