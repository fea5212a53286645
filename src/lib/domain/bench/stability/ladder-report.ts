import { type Attempt, settingWords } from './attempt';
import { failureBound } from './failure-bound';
import { highestPassed, type KindResult, type StressResult } from './highest-passed';
import { demandsOf, type LadderFacts, type LadderStress } from './ladder-facts';
import { type NextAttempt, nextAttempt } from './next-attempt';
import { recordAt } from './record-at';
import { type StressPower, stressPower } from './stress-power';
import { type VoltageNeed, voltageNeed } from './voltage-need';
import type { StressKind } from './words';

export interface StressReport {
	stress: LadderStress;
	result: Pick<StressResult, 'passed' | 'short' | 'failed'>;
	/** What to try next, and at which voltage that was asked; null where no setting is known to begin with. */
	next: NextAttempt | null;
	nextVolts: number | null;
	need: VoltageNeed;
	power: StressPower;
	/** What the record at the highest clock that passed proves; null before any pass. */
	proof: string | null;
}

export interface LadderReport {
	kinds: Record<StressKind, KindResult>;
	stresses: StressReport[];
	/** Attempts that cannot both be right, in words. */
	contradictions: string[];
}

/** Where to begin a stress that was never tried. */
export interface LadderStart {
	clockMHz: number;
	volts: number;
}

/** Steps of the board taken at once while nothing has failed, or nothing passed; common practice, no source. */
const stepsAtOnce = 4;

const none = { passed: null, short: null, failed: null };

function proofOf(attempts: readonly Attempt[], passed: Attempt | null): string | null {
	if (!passed) return null;
	const mine = attempts.filter((one) => one.stress === passed.stress);
	const { hours, failures } = recordAt(mine, passed);
	return hours > 0 ? `${settingWords(passed)}: ${failureBound(hours, failures).words}` : null;
}

/** The setting that the next proposal of a stress starts from: its last attempt, else the ladder's last, else what is given. */
function startOf(facts: LadderFacts, stress: string, start: LadderStart | null): LadderStart | null {
	return facts.attempts.findLast((one) => one.stress === stress) ?? facts.attempts.at(-1) ?? start;
}

/**
 * All that a ladder says: per stress what passed and failed, the next attempt at a voltage, the voltage each clock
 * needs, power over V²·f and what the clean record proves; heaviest and everyday load side by side; contradictions.
 * @param volts voltage to propose at; that of the last attempt of each stress where left out
 */
export function ladderReport(
	facts: LadderFacts,
	{ volts = null, start = null }: { volts?: number | null; start?: LadderStart | null } = {}
): LadderReport {
	const demands = demandsOf(facts);
	const { attempts, limits, stepMHz } = facts;
	const { stresses: results, kinds, contradictions } = highestPassed(attempts, demands);
	const reports = facts.stresses.map((stress): StressReport => {
		const result = results.find((one) => one.stress === stress.slug) ?? none;
		const from = startOf(facts, stress.slug, start);
		const nextVolts = volts ?? from?.volts ?? null;
		return {
			stress,
			result,
			nextVolts,
			next:
				from && nextVolts !== null
					? nextAttempt({
							attempts,
							stress: stress.slug,
							demands,
							volts: nextVolts,
							stepMHz,
							strideMHz: stepsAtOnce * stepMHz,
							startMHz: from.clockMHz,
							limits
						})
					: null,
			need: voltageNeed(attempts, stress.slug, demands),
			power: stressPower(attempts, stress.slug),
			proof: proofOf(attempts, result.passed)
		};
	});
	return { kinds, stresses: reports, contradictions: contradictions.map(({ words }) => words) };
}
