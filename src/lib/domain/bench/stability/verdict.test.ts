import { describe, expect, it } from 'vitest';
import { attempt } from './attempt.fixture';
import { verdictOf } from './verdict';

// Definition of this application; common practice, no source.
describe('what an attempt proves', () => {
	const demands = { 'long-sums': 30 };

	it.each([
		['passed', 30, 'passed'],
		['passed', 29.9, 'short'],
		['failed', 300, 'failed'],
		['stopped', 300, null]
	] as const)('%s after %d min', (outcome, durationMin, verdict) => {
		expect(verdictOf(attempt({ outcome, durationMin }), demands)).toBe(verdict);
	});

	it('refuses a stress that demands nothing', () => {
		expect(() => verdictOf(attempt({ stress: 'unheard-of' }), demands)).toThrow(RangeError);
		expect(() => verdictOf(attempt(), { 'long-sums': 0 })).toThrow(RangeError);
	});
});
