const firstMs = 5_000;
const longestMs = 3_600_000;

/**
 * How long a job rests after a failed attempt: 5 s, doubled each time, an hour at the most; up to a quarter more by
 * `jitter`, so that many that failed together do not come back together.
 * @param attempts failed attempts so far, from 1
 * @param jitter from 0 to 1
 * @throws RangeError for less than one attempt
 * @example retryDelayMs(3, 0) // 20000
 */
export function retryDelayMs(attempts: number, jitter: number): number {
	if (!(attempts >= 1)) throw new RangeError('There is no delay before the first attempt.');
	const whole = Math.min(longestMs, firstMs * 2 ** (attempts - 1));
	return Math.round(whole * (1 + jitter / 4));
}
