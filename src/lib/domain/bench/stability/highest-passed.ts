import type { Attempt } from './attempt';
import { type Contradiction, contradictions } from './contradictions';
import { type Demands, verdictOf } from './verdict';
import type { StressKind } from './words';

export interface StressResult {
	stress: string;
	stressKind: StressKind;
	/** The highest clock that passed for as long as the stress demands, at the lowest voltage it passed with. */
	passed: Attempt | null;
	/** The highest pass that was too short to count, where it lies above what passed. */
	short: Attempt | null;
	/** The lowest clock that failed, at the highest voltage it failed with. */
	failed: Attempt | null;
}

export interface KindResult {
	/** The highest clock that every stress of this kind passed; null where one has passed none. */
	clockMHz: number | null;
	/** The lowest voltage with which the stress that allows the least passed it, in V. */
	volts: number | null;
	/** The stress that allows the least. */
	heldBackBy: string | null;
	lowestFailedMHz: number | null;
	/** The highest voltage it failed with, in V. */
	lowestFailedVolts: number | null;
	stresses: string[];
}

export interface LadderResult {
	stresses: StressResult[];
	kinds: Record<StressKind, KindResult>;
	contradictions: Contradiction[];
}

const highest = (a: Attempt | null, b: Attempt): Attempt =>
	!a || b.clockMHz > a.clockMHz || (b.clockMHz === a.clockMHz && b.volts < a.volts) ? b : a;
const lowest = (a: Attempt | null, b: Attempt): Attempt =>
	!a || b.clockMHz < a.clockMHz || (b.clockMHz === a.clockMHz && b.volts > a.volts) ? b : a;

function ofStress(first: Attempt, attempts: readonly Attempt[], demands: Demands): StressResult {
	const mine = attempts.filter((one) => one.stress === first.stress);
	const having = (verdict: 'passed' | 'short' | 'failed') =>
		mine.filter((one) => verdictOf(one, demands) === verdict);
	const passed = having('passed').reduce<Attempt | null>(highest, null);
	const short = having('short').reduce<Attempt | null>(highest, null);
	return {
		stress: first.stress,
		stressKind: first.stressKind,
		passed,
		short: short && short.clockMHz > (passed?.clockMHz ?? 0) ? short : null,
		failed: having('failed').reduce<Attempt | null>(lowest, null)
	};
}

function ofKind(kind: StressKind, results: readonly StressResult[]): KindResult {
	const mine = results.filter((result) => result.stressKind === kind);
	const clockOf = (result: StressResult) => result.passed?.clockMHz ?? 0;
	const [first, ...others] = mine;
	const least = first && others.reduce((a, b) => (clockOf(b) < clockOf(a) ? b : a), first);
	const failed = mine.flatMap((result) => result.failed ?? []).reduce<Attempt | null>(lowest, null);
	return {
		clockMHz: least?.passed?.clockMHz ?? null,
		volts: least?.passed?.volts ?? null,
		heldBackBy: least?.stress ?? null,
		lowestFailedMHz: failed?.clockMHz ?? null,
		lowestFailedVolts: failed?.volts ?? null,
		stresses: mine.map((result) => result.stress)
	};
}

/**
 * What a ladder has shown: per stress, in the order of their first attempt, the highest clock that passed and the
 * lowest that failed, whatever their voltages; heaviest and everyday load side by side; and what does not fit.
 * RangeError for a stress that demands no minutes. Definition of this application; common practice, no source.
 * @param demands minutes by the stress's slug
 */
export function highestPassed(attempts: readonly Attempt[], demands: Demands): LadderResult {
	const firsts = attempts.filter(
		(one, index) => attempts.findIndex((other) => other.stress === one.stress) === index
	);
	const stresses = firsts.map((first) => ofStress(first, attempts, demands));
	return {
		stresses,
		kinds: { heaviest: ofKind('heaviest', stresses), everyday: ofKind('everyday', stresses) },
		contradictions: contradictions(attempts, demands)
	};
}
