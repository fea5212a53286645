import { stressKindWords } from '../../bench/stability/attempt';
import { demandsOf, type LadderFacts, type LadderStress } from '../../bench/stability/ladder-facts';
import { verdictOf } from '../../bench/stability/verdict';
import { voltageNeed } from '../../bench/stability/voltage-need';
import { printedWithUnit } from '../../shared/quantity';
import { printedDates } from '../dates';
import type { PlateBase } from './plate-base';

export const ladderResults = ['passed', 'short', 'failed', 'stopped'] as const;
export type LadderMark = (typeof ladderResults)[number];

/** What an attempt shows, in the words of the table. */
export const ladderMarkWords: Record<LadderMark, string> = {
	passed: 'passed',
	short: 'passed, too short to count',
	failed: 'failed',
	stopped: 'stopped by hand'
};

export interface LadderTry {
	clockMHz: number;
	volts: number;
	durationMin: number;
	result: LadderMark;
	failure: string;
	peakTempC: number | null;
	packageW: number | null;
}

export interface LadderSeries {
	stress: string;
	name: string;
	/** Heaviest or everyday load, and the minutes that count as a pass. */
	demand: string;
	/** 1 for the first stress, in blue; then the further series. */
	series: number;
	tries: LadderTry[];
	/** The lowest voltage that passed at each clock, ascending. */
	need: { clockMHz: number; volts: number }[];
}

/** Attempts of a ladder: clock across, voltage up. */
export interface LadderSpec extends PlateBase {
	kind: 'ladder';
	ladder: string;
	limits: { clockMHz: number; volts: number };
	series: LadderSeries[];
}

function seriesOf(facts: LadderFacts, stress: LadderStress, index: number): LadderSeries {
	const demands = demandsOf(facts);
	const mine = facts.attempts.filter((one) => one.stress === stress.slug);
	return {
		stress: stress.slug,
		name: stress.name,
		demand: `${stressKindWords[stress.kind]}, ${printedWithUnit(stress.minutes, 'min')}`,
		series: index + 1,
		tries: mine.map((one) => ({
			clockMHz: one.clockMHz,
			volts: one.volts,
			durationMin: one.durationMin,
			result: verdictOf(one, demands) ?? 'stopped',
			failure: one.failure,
			peakTempC: one.peakTempC,
			packageW: one.packageW
		})),
		need: voltageNeed(mine, stress.slug, demands).needs.map(({ clockMHz, volts }) => ({ clockMHz, volts }))
	};
}

/** A ladder's attempts as a plate; null where nothing that stands was tried. */
export function ladderSpec(
	facts: LadderFacts,
	zone: string,
	{ campaign = '', title }: { campaign?: string; title?: string } = {}
): LadderSpec | null {
	const series = facts.stresses
		.map((stress, index) => seriesOf(facts, stress, index))
		.filter((one) => one.tries.length > 0);
	if (series.length === 0) return null;
	const { rig, limits, attempts } = facts;
	const dates = printedDates(
		attempts.map((one) => one.at),
		zone
	);
	return {
		kind: 'ladder',
		campaign,
		ladder: facts.slug,
		title: title ?? facts.name,
		sub: 'Core voltage over core clock. Full marks passed, crosses failed; the line joins the lowest voltage that passed at each clock.',
		limits: { clockMHz: limits.clockMHz, volts: limits.volts },
		series,
		foot: [
			`${attempts.length === 1 ? '1 attempt' : `${attempts.length} attempts`} over the profile ${facts.profile.name}; a pass is ${series.map((one) => `${one.name} for ${one.demand.replace(/^.*, /, '')}`).join(', ')} without failure.`,
			'What passed here need not pass on another sample.',
			`Rig ${rig.name}, revision ${rig.revision}${dates ? `, ${dates}` : ''}.`
		]
	};
}
