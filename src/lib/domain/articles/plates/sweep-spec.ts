import { sweepReport, type SweepFacts } from '../../bench/stability/sweep-facts';
import type { SwitchPoint } from '../../bench/stability/switch-point';
import type { SweepPoint } from '../../bench/stability/thread-sweep';
import { halfWidthOf, printed, printedRange, printedWithUnit, withUnit } from '../../shared/quantity';
import { printedDates } from '../dates';
import type { PlateBase } from './plate-base';

/** Points of a sweep: load current across, clock up. */
export interface SweepSpec extends PlateBase {
	kind: 'sweep';
	sweep: string;
	wantedMHz: number;
	passes: { number: number; series: number; points: SweepPoint[] }[];
	/** The falling fit through all passes. */
	fit: { currentA: number; clockMHz: number }[];
	crossingA: number | null;
	ci95: [number, number] | null;
	setA: number | null;
	/** The crossing, or why there is none, beside the drawing. */
	answer: string;
}

function answerOf({ kind, crossingA, ci95 }: SwitchPoint): string {
	if (kind === 'always-below') return 'under it throughout';
	if (crossingA === null) return 'not reached';
	const at = printed(crossingA, ci95 ? { halfWidth: halfWidthOf(ci95) } : { decimals: 1 });
	return ci95
		? `${withUnit(at, 'A')} (${withUnit(printedRange(ci95, { halfWidth: halfWidthOf(ci95) }), 'A')})`
		: withUnit(at, 'A');
}

/** A sweep as a plate; null where no pass stands. */
export function sweepSpec(
	facts: SweepFacts,
	zone: string,
	{ campaign = '', title }: { campaign?: string; title?: string } = {}
): SweepSpec | null {
	const report = sweepReport(facts);
	if (!report) return null;
	const { point } = report;
	const { rig, passes, wantedMHz } = facts;
	const dates = printedDates(
		passes.map((pass) => pass.startedAt),
		zone
	);
	const interval = point.ci95
		? 'the band is the 95 % interval of the crossing over the passes (Student’s t).'
		: 'there is no interval of the crossing.';
	return {
		kind: 'sweep',
		campaign,
		sweep: facts.slug,
		title: title ?? facts.name,
		sub: `Core clock over load current under automatic boost. The line never rises; the scribed one is the fixed clock of ${printedWithUnit(wantedMHz, 'MHz')}.`,
		wantedMHz,
		passes: passes.map(({ number, points }, index) => ({ number, series: index + 1, points })),
		fit: point.fit.map(({ currentA, clockMHz }) => ({ currentA, clockMHz })),
		crossingA: point.crossingA,
		ci95: point.ci95,
		setA: point.setA,
		answer: answerOf(point),
		foot: [
			`${facts.workload.name} with rising threads, ${passes.length === 1 ? '1 pass' : `${passes.length} passes`} over the profile ${facts.profile.name}; ${interval}`,
			`Rig ${rig.name}, revision ${rig.revision}${dates ? `, ${dates}` : ''}.`
		]
	};
}
