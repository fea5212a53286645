import { median } from 'simple-statistics';
import { printed, printedWithUnit } from '../../shared/quantity';
import type { Attempt } from './attempt';
import { type Demands, verdictOf } from './verdict';

export interface VoltageStep {
	fromMHz: number;
	toMHz: number;
	/** Millivolts that the step asks for each 100 MHz; below zero where a higher clock passed with less. */
	mvPer100MHz: number;
}

export interface SteepRule {
	/** How many times the median of the steps below it a step must ask to be steep. */
	times: number;
	/** Millivolts for each 100 MHz under which no step is steep: the grain of the board's own voltage steps. */
	leastMvPer100MHz: number;
}

const usualRule: SteepRule = { times: 2, leastMvPer100MHz: 10 };

export interface VoltageNeed {
	/** Per clock, ascending, the pass with the lowest voltage. */
	needs: Attempt[];
	steps: VoltageStep[];
	/** The first step that is steep, and the median of those below it; null where none is. */
	steep: (VoltageStep & { medianBelow: number }) | null;
	/** The rule and its answer, for people. */
	words: string;
}

const rate = (mv: number) => printed(mv, { decimals: 0 });

/** The rule for people. @example steepRuleWords({ times: 2, leastMvPer100MHz: 10 }) */
export const steepRuleWords = ({ times, leastMvPer100MHz }: SteepRule = usualRule): string =>
	`A step is steep when it asks for more than ${printed(times)} times the millivolts per 100 MHz of the median step below it, and for more than ${printed(leastMvPer100MHz)} mV.`;

function firstSteep(steps: readonly VoltageStep[], rule: SteepRule): VoltageNeed['steep'] {
	for (const [index, step] of steps.entries()) {
		const below = steps.slice(0, index).map((one) => one.mvPer100MHz);
		if (below.length < 2) continue;
		const medianBelow = Math.max(0, median(below));
		if (step.mvPer100MHz > rule.times * medianBelow && step.mvPer100MHz > rule.leastMvPer100MHz)
			return { ...step, medianBelow };
	}
	return null;
}

function answer(steps: readonly VoltageStep[], steep: VoltageNeed['steep']): string {
	if (steep)
		return `Beyond ${printedWithUnit(steep.fromMHz, 'MHz')} it turns steep: the next step asks for ${rate(steep.mvPer100MHz)} mV per 100 MHz, the median step below for ${rate(steep.medianBelow)} mV.`;
	if (steps.length < 3) return 'Four clocks that passed are needed to tell.';
	return 'Up to the highest clock that passed it does not turn steep.';
}

/**
 * The lowest voltage that passed at each clock for one stress, and the clock beyond which it turns steep: the first
 * step that asks for more than `times` the millivolts per 100 MHz of the median of the steps below it, and for more
 * than the board's grain. The two lowest steps are never steep, there being too little below them. Common practice,
 * no source. RangeError for a stress that demands no minutes.
 */
export function voltageNeed(
	attempts: readonly Attempt[],
	stress: string,
	demands: Demands,
	rule: SteepRule = usualRule
): VoltageNeed {
	const byClock = new Map<number, Attempt>();
	for (const one of attempts) {
		if (one.stress !== stress || verdictOf(one, demands) !== 'passed') continue;
		const before = byClock.get(one.clockMHz);
		if (!before || one.volts < before.volts) byClock.set(one.clockMHz, one);
	}
	const needs = [...byClock.values()].sort((a, b) => a.clockMHz - b.clockMHz);
	const steps = needs.slice(1).map((to, index) => {
		const from = needs[index] ?? to;
		return {
			fromMHz: from.clockMHz,
			toMHz: to.clockMHz,
			mvPer100MHz: ((to.volts - from.volts) * 1e5) / (to.clockMHz - from.clockMHz)
		};
	});
	const steep = firstSteep(steps, rule);
	return { needs, steps, steep, words: `${answer(steps, steep)} ${steepRuleWords(rule)}` };
}
