import { describe, expect, it } from 'vitest';
import { normalQuantile, normalUpperTail } from './normal';

describe('the normal distribution', () => {
	// SciPy 1.17.1, scipy.stats.norm.ppf; R 4.2.2 gives 1.95996398454 for qnorm(0.975) as well.
	it.each([
		[0.975, 1.959963984540054],
		[0.95, 1.6448536269514722],
		[0.9, 1.2815515655446004],
		[0.6, 0.2533471031357997],
		[0.51, 0.02506890825871106],
		[0.999, 3.090232306167813]
	])('quantile at %d', (p, z) => {
		expect(normalQuantile(p)).toBeCloseTo(z, 9);
		expect(normalQuantile(1 - p)).toBeCloseTo(-z, 9);
		expect(normalUpperTail(z)).toBeCloseTo(1 - p, 10);
	});

	it('has half on each side of zero', () => {
		expect(normalUpperTail(0)).toBe(0.5);
		expect(normalQuantile(0.5)).toBeCloseTo(0, 12);
	});
});
