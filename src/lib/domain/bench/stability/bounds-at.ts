import type { Attempt } from './attempt';
import { type Demands, verdictOf } from './verdict';

export interface BoundsAt {
	/** The highest pass under every fail. */
	passed: Attempt | null;
	/** The lowest fail. */
	failed: Attempt | null;
	/** Passes at or above that fail, which do not count against it. */
	overruled: Attempt[];
}

/**
 * Between which clocks the limit of a stress lies at a voltage. A pass with less voltage counts as a pass, a fail with
 * more as a fail; a fail outranks a pass above it, the careful reading of a contradiction. Common practice, no source.
 */
export function boundsAt(
	attempts: readonly Attempt[],
	{ stress, volts, demands }: { stress: string; volts: number; demands: Demands }
): BoundsAt {
	const mine = attempts.filter((one) => one.stress === stress);
	const passes = mine
		.filter((one) => one.volts <= volts && verdictOf(one, demands) === 'passed')
		.sort((a, b) => b.clockMHz - a.clockMHz || b.volts - a.volts);
	const [failed = null] = mine
		.filter((one) => one.volts >= volts && verdictOf(one, demands) === 'failed')
		.sort((a, b) => a.clockMHz - b.clockMHz || a.volts - b.volts);
	const ceiling = failed?.clockMHz ?? Infinity;
	return {
		passed: passes.find((one) => one.clockMHz < ceiling) ?? null,
		failed,
		overruled: passes.filter((one) => one.clockMHz >= ceiling)
	};
}
