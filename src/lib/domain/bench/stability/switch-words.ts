import { halfWidthOf, printed, printedRange, printedWithUnit, withUnit } from '../../shared/quantity';
import type { SwitchPoint } from './switch-point';

const a = (current: number) => printedWithUnit(Number(current.toFixed(6)), 'A');
const mhz = (clock: number) => printedWithUnit(clock, 'MHz');
const times = (n: number) => (n === 1 ? '1 pass' : `${n} passes`);

function uncertainty({ ci95, passes }: SwitchPoint): string {
	if (ci95)
		return ` With 95 % confidence it lies at ${withUnit(printedRange(ci95, { halfWidth: halfWidthOf(ci95) }), 'A')} (${times(passes.length)}).`;
	if (passes.length === 1) return ' One pass gives no interval: repeat the sweep.';
	const crossing = passes.filter((one) => one.kind === 'crosses').length;
	return ` ${crossing} of ${times(passes.length)} cross it, so there is no interval: repeat the sweep, or measure further.`;
}

function advice({ setA, marginA }: SwitchPoint, wantedMHz: number): string {
	if (setA === null || marginA === null)
		return ' The margin is as wide as the current itself: repeat the sweep before you set a switch.';
	return ` Set the switch at ${a(setA)} or a little below. Too low gives up a little boost where it is hardly above ${mhz(wantedMHz)}; too high leaves the part slower than ${mhz(wantedMHz)} between the crossing and the switch. Below ${a(setA)} the board boosts by itself; from there on it holds ${mhz(wantedMHz)}.`;
}

/** What a switch point says, and what to set, for people. */
export function switchWords(point: SwitchPoint, wantedMHz: number): string {
	const lowest = point.fit[0];
	const highest = point.fit.at(-1);
	if (point.crossingA !== null) {
		const at = withUnit(
			printed(point.crossingA, {
				halfWidth: halfWidthOf(point.ci95),
				...(point.ci95 ? {} : { decimals: 1 })
			}),
			'A'
		);
		return `Automatic boost falls under ${mhz(wantedMHz)} at ${at}.${uncertainty(point)}${advice(point, wantedMHz)}`;
	}
	const mixed = point.passes.some((one) => one.kind !== point.kind) ? uncertainty(point) : '';
	if (point.kind === 'always-below')
		return `Automatic boost is under ${mhz(wantedMHz)} from the first point on${lowest ? `, at ${a(lowest.currentA)}` : ''}: the fixed clock is the faster one throughout what was measured, or the switch lies at less current. Measure fewer threads to tell.${mixed}`;
	return `Automatic boost never falls under ${mhz(wantedMHz)}${highest ? `, up to ${a(highest.currentA)}` : ''}: no switch is called for in what was measured. Beyond it nothing is known.${mixed}`;
}
