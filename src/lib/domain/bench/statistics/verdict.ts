import type { Verdict } from '../figures';
import type { PValues } from './tost';

/** Below this a question counts as answered. */
const alpha = 0.05;

/**
 * Verdict of the two p-values of a comparison: *better* or *worse* where it differs by more than matters, *no
 * difference* where it lies inside, else *not enough*. Null p-values: the readings allow no test.
 * @param forBetter whether the estimate lies on the better side
 */
export function verdictOf(p: PValues | null, forBetter: boolean): Verdict {
	if (!p) return 'not-enough';
	if (p.pDiffer < alpha) return forBetter ? 'better' : 'worse';
	return p.pEquivalent < alpha ? 'no-difference' : 'not-enough';
}
