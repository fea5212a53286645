import { describe, expect, it } from 'vitest';
import { verdictOf } from './verdict';

describe('a verdict', () => {
	it.each([
		[0.049, 1, true, 'better'],
		[0.049, 1, false, 'worse'],
		[1, 0.049, true, 'no-difference'],
		[0.05, 0.05, true, 'not-enough'],
		[0.3, 0.6, false, 'not-enough']
	])('of %d and %d', (pDiffer, pEquivalent, forBetter, verdict) => {
		expect(verdictOf({ pDiffer, pEquivalent }, forBetter)).toBe(verdict);
	});

	it('is none without a test', () => {
		expect(verdictOf(null, true)).toBe('not-enough');
	});
});
