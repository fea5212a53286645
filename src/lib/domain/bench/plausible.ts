import { printed } from '../shared/quantity';
import { scaledUnit } from '../shared/units';

/** From so many times on a reading is asked about (common practice, no source). */
const farTimes = 100;

/** A reading that stands so far from the others that a unit or a decimal mark was probably mistyped. */
export interface Doubt {
	/** The others' median, in the workload's unit. */
	median: number;
	/** How many times that the reading is, below 1 for one that is too small. */
	times: number;
	/** What it would be with the power of a thousand put right that lies nearest. */
	suggested: number;
	/** 1000, 1/1000, a million …: what it would be divided by. */
	divisor: number;
	/** The unit that would explain it; null where none does. */
	unit: string | null;
}

function medianOf(values: readonly number[]): number | null {
	const sorted = [...values].sort((a, b) => a - b);
	const [low, high] = [sorted[(sorted.length - 1) >> 1], sorted[sorted.length >> 1]];
	return low === undefined || high === undefined ? null : low / 2 + high / 2;
}

/**
 * Whether a reading must be asked about: its size is a hundred times the median of the others or a hundredth of it.
 * Null where it is not, where there are no others, and for zeros, which have no ratio.
 * @param value in the workload's unit
 * @param others readings of its cell, or of the baseline's while the cell is empty
 * @example doubtOf(31250, [31.1, 31.2, 31.3], 's')?.unit // 'ms'
 */
export function doubtOf(value: number, others: readonly number[], unit: string): Doubt | null {
	const median = medianOf(others);
	if (median === null || median === 0 || value === 0) return null;
	const times = Math.abs(value / median);
	if (!Number.isFinite(times) || times === 0 || (times < farTimes && times > 1 / farTimes)) return null;
	const thousands = Math.round(Math.log10(times) / 3) || (times > 1 ? 1 : -1);
	const divisor = 10 ** (3 * thousands);
	// Multiplied rather than divided by a fraction, so that 0.03125 becomes 31.25 to the last bit.
	const suggested = thousands > 0 ? value / divisor : value * 10 ** (-3 * thousands);
	return { median, times, suggested, divisor, unit: scaledUnit(unit, divisor) };
}

const about = (times: number): string =>
	times < 1e12 ? printed(Number(times.toPrecision(2))) : 'more than a billion';

/** The doubt as a question to who typed it. @example doubtWords(31250, doubt) // '31 250 is about 1000 times the others (31.2). Is it in ms?' */
export function doubtWords(value: number, { median, times, unit }: Doubt): string {
	const size = times > 1 ? `about ${about(times)} times` : `about 1/${about(1 / times)} of`;
	return `${printed(value)} is ${size} the others (${printed(median)}).${unit ? ` Is it in ${unit}?` : ' Is that right?'}`;
}
