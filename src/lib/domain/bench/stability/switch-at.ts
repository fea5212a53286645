import { halfWidthOf } from '../../shared/quantity';
import { positive } from '../tuning/positive';

/**
 * The current to set for a crossing, in A: the crossing less a margin of half its interval and one step of the board,
 * down to the board's grid. At or below the lower end, because the two mistakes cost differently: a little too low
 * gives up a little boost where it is hardly above the fixed clock, too high leaves the part under the fixed clock
 * between the crossing and the switch. Null where the margin eats the whole current. Common practice, no source.
 * @example switchAt(163.3, [160.3, 166.3], 1) // { marginA: 4, setA: 159 }
 */
export function switchAt(
	crossingA: number,
	ci95: readonly [number, number] | null,
	stepA: number
): { marginA: number; setA: number | null } {
	positive(stepA, "board's step of current");
	const marginA = (halfWidthOf(ci95) ?? 0) + stepA;
	const setA = Number((Math.floor((crossingA - marginA) / stepA + 1e-9) * stepA).toFixed(6));
	return { marginA, setA: setA > 0 ? setA : null };
}
