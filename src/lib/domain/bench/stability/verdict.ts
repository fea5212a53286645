import type { Attempt } from './attempt';

/** Minutes that a stress must run without failure before it counts as passed, by the stress's slug. */
export type Demands = Readonly<Record<string, number>>;

/** The minutes that a stress demands; RangeError for a stress without any. */
function demandedMinutes(stress: string, demands: Demands): number {
	const minutes = demands[stress];
	if (minutes === undefined || !(minutes > 0))
		throw new RangeError(`The stress “${stress}” demands no minutes, so nothing can pass it.`);
	return minutes;
}

/**
 * What an attempt proves about its setting: 'passed' when it passed for as long as its stress demands,
 * 'short' when it passed but not long enough, 'failed', or null when it was stopped by hand.
 * RangeError for a stress that demands no minutes.
 */
export function verdictOf(attempt: Attempt, demands: Demands): 'passed' | 'short' | 'failed' | null {
	if (attempt.outcome === 'stopped') return null;
	if (attempt.outcome === 'failed') return 'failed';
	return attempt.durationMin >= demandedMinutes(attempt.stress, demands) ? 'passed' : 'short';
}
