import type { Attempt } from './attempt';

export interface RunRecord {
	hours: number;
	failures: number;
	attempts: number;
}

/**
 * Hours and failures at one setting over attempts of every outcome, short passes and stops included, since each
 * minute without a failure counts. A failed attempt is one failure however many errors it counted: they come of one
 * another. Attempts of several stresses may be given; they are then one record.
 */
export function recordAt(
	attempts: readonly Attempt[],
	setting: Pick<Attempt, 'clockMHz' | 'volts'>
): RunRecord {
	const mine = attempts.filter((one) => one.clockMHz === setting.clockMHz && one.volts === setting.volts);
	return {
		hours: mine.reduce((sum, one) => sum + one.durationMin, 0) / 60,
		failures: mine.filter((one) => one.outcome === 'failed').length,
		attempts: mine.length
	};
}
