import { driftOf, type DriftPoint, type DriftWindow } from '../../bench/drift';
import type { DriftFacts } from '../../bench/drift-facts';
import type { ControlLimits } from '../../bench/statistics/control-limits';
import { halfWidthOf, printedWithUnit } from '../../shared/quantity';
import { printedDates } from '../dates';
import type { PlateBase } from './plate-base';

/** The runs of stock with one workload on one rig, over time. */
export interface DriftSpec extends PlateBase {
	kind: 'drift';
	rig: string;
	workload: string;
	unit: string;
	limits: ControlLimits;
	points: DriftPoint[];
}

const countOf = (points: readonly DriftPoint[]): string => {
	const signalling = points.filter(({ signals }) => signals.length > 0).length;
	if (signalling === 0) return 'No run after them signals.';
	return signalling === 1 ? 'One run signals, ringed.' : `${signalling} runs signal, ringed.`;
};

/** A rig's drift as a plate; null where its runs give no limits. */
export function driftSpec(
	facts: DriftFacts,
	zone: string,
	{ campaign = '', title, window }: { campaign?: string; title?: string; window?: Partial<DriftWindow> } = {}
): DriftSpec | null {
	const { limits, points, window: used } = driftOf(facts.runs, window);
	if (!limits) return null;
	const { rig, workload } = facts;
	const precision = { halfWidth: halfWidthOf([limits.lower, limits.upper]) };
	return {
		kind: 'drift',
		campaign,
		rig: rig.slug,
		workload: workload.slug,
		unit: workload.unit,
		title: title ?? `${rig.name}: ${workload.name} with stock over time`,
		sub: `Mean of each run in ${workload.unit}, with its weighted average; below, the distance from the run before.`,
		limits,
		points,
		foot: [
			`Limits from runs ${used.from} to ${used.to}: ${printedWithUnit(limits.centre, workload.unit, precision)}, and three of its short-term deviations to either side. ${countOf(points)} A signal asks what changed; it proves nothing.`,
			'The weighted average begins anew at the centre when the rig was revised, and with the first run back across the centre after a signal, so that a shift that was mended does not go on signalling.',
			`Rig ${rig.name}, ${printedDates(
				points.map(({ at }) => at),
				zone
			)}.`
		]
	};
}
