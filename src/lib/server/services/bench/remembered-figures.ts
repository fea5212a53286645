import type { Figuring } from '../../../domain/bench/campaign';
import type { Summary } from '../../../domain/bench/figures';
import { testCell, type HeldWorkload, type Tested } from '../../../domain/bench/held-against';
import { summarise } from '../../../domain/bench/statistics/summary';
import { bounded } from '../../bounded';

/** A rule as far as a test depends on it. */
const ruleKey = ({ unit, better, headline, leastDifferencePercent }: HeldWorkload): string =>
	`${better} ${headline} ${leastDifferencePercent} ${unit}`;

/**
 * Figures worked out once for the same readings, whatever cell, campaign or watcher they are wanted for. Keyed by the
 * readings themselves, so that nothing remembered can be stale.
 * @param most summaries that are kept; the one used longest ago goes first, and its tests with it
 */
export function rememberedFigures(most: number): Figuring {
	const summaryOf = bounded<string, Summary>(most);
	// By the two summaries themselves: a test is forgotten when they are.
	const tests = new WeakMap<Summary, WeakMap<Summary, Map<string, Tested>>>();
	return {
		summarise: (values, headline = 'mean') =>
			summaryOf(`${headline} ${values.join(' ')}`, () => summarise(values, headline)),
		testCell(subject, baseline, workload) {
			const against = tests.get(subject) ?? new WeakMap<Summary, Map<string, Tested>>();
			tests.set(subject, against);
			const byRule = against.get(baseline) ?? new Map<string, Tested>();
			against.set(baseline, byRule);
			const key = ruleKey(workload);
			const found = byRule.get(key) ?? testCell(subject, baseline, workload);
			byRule.set(key, found);
			return found;
		}
	};
}
