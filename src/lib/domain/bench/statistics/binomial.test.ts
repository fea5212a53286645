import { describe, expect, it } from 'vitest';
import { fairCoinAtMost } from './binomial';

describe('a fair coin', () => {
	it.each([
		// Pascal's triangle by hand.
		[-1, 5, 0],
		[0, 6, 1 / 64],
		[1, 10, 11 / 1024],
		[2, 4, 11 / 16],
		[7, 7, 1],
		[9, 7, 1]
	])('lands heads at most %d times in %d with probability %d', (k, n, share) => {
		expect(fairCoinAtMost(k, n)).toBeCloseTo(share, 14);
	});
});
