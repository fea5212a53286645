import { positive } from './positive';

interface Point {
	/** Core voltage in volts. */
	volts: number;
	/** Core clock, in the same unit on both sides. */
	clock: number;
}

/**
 * Dynamic power of one point over another, V²·f of each: an estimate of switching power alone, leakage left out.
 * RangeError for what is not above zero.
 * @example dynamicPowerFactor({ volts: 1.35, clock: 5200 }, { volts: 1.2, clock: 4700 }) // 1.400…
 */
export function dynamicPowerFactor(now: Point, before: Point): number {
	const voltage = positive(now.volts, 'voltage') / positive(before.volts, 'voltage before');
	return voltage ** 2 * (positive(now.clock, 'clock') / positive(before.clock, 'clock before'));
}
