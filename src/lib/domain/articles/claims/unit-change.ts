import { plainUnit, unitOf } from '../../shared/units';
import type { Datum } from './datum';

const sameName: Record<string, string> = {
	sones: 'sone',
	us: 'μs',
	RPM: 'rpm',
	dB: 'dB(A)',
	'°': '°C',
	KB: 'kB',
	clocks: ''
};

/** A unit by the one name it has here. */
export const plainName = (unit: string): string => sameName[plainUnit(unit)] ?? plainUnit(unit);

const factors = new Map<string, number | null>();

function factorOf(from: string, to: string): number | null {
	const key = `${from} ${to}`;
	const known = factors.get(key);
	if (known !== undefined) return known;
	const [ours, theirs] = [plainName(from), plainName(to)];
	const [a, b] = [unitOf(ours), unitOf(theirs)];
	const factor = ours === theirs ? 1 : a && b && a.kind === b.kind ? a.factor / b.factor : null;
	factors.set(key, factor);
	return factor;
}

/** A value of one unit in another; null where they are not of one kind. A difference of 1 °C is one of 1 K. */
export function converted(value: number, from: string, to: string): number | null {
	const factor = factorOf(from, to);
	if (factor === null || factor === 1) return factor === null ? null : value;
	// To twelve digits, so that 4950 MHz is 4.95 GHz to the digit.
	return Number((value * factor).toPrecision(12));
}

/** A datum with its value in the unit that was printed. */
export interface Turned {
	datum: Datum;
	value: number;
}

const turned = new WeakMap<readonly Datum[], Map<string, Turned[]>>();

/** Those of some data that can be put in a unit, kept as long as the data. */
export function inUnit(data: readonly Datum[], unit: string): Turned[] {
	const known = turned.get(data) ?? new Map<string, Turned[]>();
	turned.set(data, known);
	const before = known.get(unit);
	if (before) return before;
	const found = data.flatMap((datum) => {
		const value = converted(datum.value, datum.unit, unit);
		return value === null ? [] : [{ datum, value }];
	});
	known.set(unit, found);
	return found;
}
