import { expect, it } from 'vitest';
import { retryDelayMs } from './retry-delay';

it('doubles from five seconds to an hour, with a little scatter', () => {
	expect([1, 2, 3, 4].map((attempts) => retryDelayMs(attempts, 0))).toEqual([5_000, 10_000, 20_000, 40_000]);
	expect(retryDelayMs(40, 0)).toBe(3_600_000);
	expect(retryDelayMs(1, 1)).toBe(6_250);
	expect(() => retryDelayMs(0, 0)).toThrow(RangeError);
});
