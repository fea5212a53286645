/** What a unit measures, and how many of the kind's base unit it is; a temperature's zero lies elsewhere as well. */
export interface KnownUnit {
	kind: UnitKind;
	factor: number;
}

const kindWords = {
	time: 'a time',
	power: 'a power',
	temperature: 'a temperature',
	voltage: 'a voltage',
	current: 'a current',
	frequency: 'a frequency',
	throughput: 'a throughput',
	'frame-rate': 'a frame rate',
	sound: 'a sound level',
	energy: 'an energy',
	score: 'a score'
} as const;
export type UnitKind = keyof typeof kindWords;

/** A kind of quantity in words. @example kindOfWords('time') // 'a time' */
export const kindOfWords = (kind: UnitKind): string => kindWords[kind];

/**
 * Units that benches write, by kind. SI prefixes and the units accepted beside them: SI Brochure, 9th edition, tables 7
 * and 8. Binary prefixes: IEC 80000-13. Points and frames a second are names for counts (common practice, no source).
 */
const table: Record<UnitKind, Record<string, number>> = {
	time: { s: 1, ms: 1e-3, μs: 1e-6, ns: 1e-9, min: 60, h: 3600 },
	power: { W: 1, mW: 1e-3, kW: 1e3 },
	temperature: { '°C': 1, K: 1, '°F': 5 / 9 },
	voltage: { V: 1, mV: 1e-3 },
	current: { A: 1, mA: 1e-3 },
	frequency: { Hz: 1, kHz: 1e3, MHz: 1e6, GHz: 1e9 },
	throughput: {
		'B/s': 1,
		'kB/s': 1e3,
		'MB/s': 1e6,
		'GB/s': 1e9,
		'TB/s': 1e12,
		'KiB/s': 2 ** 10,
		'MiB/s': 2 ** 20,
		'GiB/s': 2 ** 30
	},
	'frame-rate': { 'frames/s': 1, fps: 1 },
	sound: { 'dB(A)': 1, dBA: 1 },
	energy: { J: 1, mJ: 1e-3, kJ: 1e3, Wh: 3600, kWh: 3.6e6 },
	score: { points: 1, point: 1 }
};

const known = new Map<string, KnownUnit>(
	Object.entries(table).flatMap(([kind, units]) =>
		Object.entries(units).map(([unit, factor]) => [unit, { kind: kind as UnitKind, factor }] as const)
	)
);

/** A unit as it is compared: without blanks around it, the micro sign and the Greek letter being one. */
export const plainUnit = (unit: string): string => unit.trim().replaceAll('\u00b5', '\u03bc');

/** What a unit measures; null for one that is not in the table, such as events/s. @example unitOf('ms')?.kind // 'time' */
export const unitOf = (unit: string): KnownUnit | null => known.get(plainUnit(unit)) ?? null;

/** Every unit of a kind, or of all kinds. */
export const unitsOf = (kind?: UnitKind): string[] =>
	[...known].filter(([, unit]) => kind === undefined || unit.kind === kind).map(([name]) => name);

/**
 * The unit of the same kind of which so many make one of this; null where there is none. Temperatures and levels, whose
 * scales are not proportional, have none.
 * @example scaledUnit('s', 1000) // 'ms'
 */
export function scaledUnit(unit: string, times: number): string | null {
	const own = unitOf(unit);
	if (!own || own.kind === 'temperature' || own.kind === 'sound') return null;
	const wanted = own.factor / times;
	const near = [...known].find(
		([, other]) => other.kind === own.kind && Math.abs(other.factor / wanted - 1) < 1e-9
	);
	return near?.[0] ?? null;
}
