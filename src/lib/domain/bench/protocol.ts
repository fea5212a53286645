import { printed } from '../shared/quantity';
import type { WorkloadFacts } from './figures';

type Protocol = Pick<
	WorkloadFacts,
	'quantity' | 'unit' | 'better' | 'warmUps' | 'repeats' | 'coolDownS' | 'headline' | 'leastDifferencePercent'
>;

const times = (n: number, one: string, many: string) => (n === 1 ? one : `${n} ${many}`);

/** Seconds in the words of a protocol. @example rest(90) // '90 s' */
function rest(seconds: number): string {
	if (seconds >= 120 && seconds % 60 === 0) return `${seconds / 60} minutes`;
	return `${seconds} s`;
}

/**
 * How a workload is measured, as sentences that a reader can follow.
 * @example protocolSentence(workload) // 'After 1 warm-up run that is not counted, it is run 7 times …'
 */
export function protocolSentence(w: Protocol): string {
	const warmUp =
		w.warmUps === 0
			? 'Without a warm-up, it is'
			: `After ${times(w.warmUps, 'a warm-up run that is not counted', 'warm-up runs that are not counted')}, it is`;
	const runs = w.repeats === 1 ? 'run once' : `run ${w.repeats} times`;
	const pause =
		w.coolDownS > 0 && w.repeats > 1 ? ` with ${rest(w.coolDownS)} to cool down between runs` : '';
	const way = w.better === 'higher' ? 'more is better' : 'less is better';
	const least = printed(w.leastDifferencePercent, { decimals: decimalsOf(w.leastDifferencePercent) });
	return `${warmUp} ${runs}${pause}. Each run gives one reading of ${w.quantity} in ${w.unit}; ${way}. In print stands the ${w.headline}. A difference under ${least} % does not matter in use.`;
}

/** Decimals of a number as it was typed, three at most. */
const decimalsOf = (value: number): number => (String(value).split('.')[1] ?? '').length;
