import { describe, expect, it } from 'vitest';
import { normalQuantile, normalUpperTail } from './normal';

describe('the normal distribution', () => {
	// R 4.2.2 gives 1.95996398454 for qnorm(0.975); the others are from memory of printed tables.
	it.each([
		[0.975, 1.95996398454],
		[0.95, 1.64485362695],
		[0.9, 1.28155156554],
		[0.6, 0.25334710314],
		[0.51, 0.02506890826],
		[0.999, 3.09023230617]
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
