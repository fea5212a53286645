/** Standard uncertainty of a value somewhere within ±a, all places alike: a / √3 (JCGM 100:2008, 4.3.7). */
export function rectangular(halfWidth: number): number {
	if (!(halfWidth >= 0)) throw new RangeError('A half width cannot be below zero.');
	return halfWidth / Math.sqrt(3);
}

/** Standard uncertainty from reading a display that moves in steps: δ / √12 (JCGM 100:2008, F.2.2.1). */
export const ofResolution = (step: number): number => rectangular(step / 2);

/** What an instrument's data sheet promises, as it is written there. */
export interface Accuracy {
	/** ± this share of the reading, in percent. */
	percentOfReading?: number;
	/** and ± this many counts of the last digit shown. */
	digits?: number;
	/** The last digit shown, in the unit of the reading; needed with `digits`. */
	resolution?: number;
	/** and ± a fixed amount, in the unit of the reading. */
	fixed?: number;
}

/**
 * Type B standard uncertainty of a reading by its instrument's accuracy "±(x % of reading + y digits)": the parts add
 * to one half width, as data sheets mean it, and that is taken as rectangular. In the unit of the reading.
 * RangeError for digits without a resolution, or a part below zero. Source: JCGM 100:2008, 4.3.7.
 * @example ofInstrument(120, { percentOfReading: 0.5, digits: 2, resolution: 0.1 }) // 0.8 / √3
 */
export function ofInstrument(
	reading: number,
	{ percentOfReading = 0, digits = 0, resolution, fixed = 0 }: Accuracy
): number {
	if (![percentOfReading, digits, fixed, resolution ?? 0].every((part) => part >= 0)) {
		throw new RangeError('An accuracy has no part below zero.');
	}
	if (digits > 0 && resolution === undefined) {
		throw new RangeError('Digits of accuracy need the resolution of the display.');
	}
	return rectangular((Math.abs(reading) * percentOfReading) / 100 + digits * (resolution ?? 0) + fixed);
}
