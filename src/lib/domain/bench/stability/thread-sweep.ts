import { median } from 'simple-statistics';
import { printed, printedWithUnit } from '../../shared/quantity';

export interface SweepPoint {
	threads: number;
	currentA: number;
	clockMHz: number;
}

export interface SweepFinding {
	/** Index of the point. */
	row: number;
	field: keyof SweepPoint;
	/** What is refused must change; what is asked about may stand when a person says so. */
	kind: 'refused' | 'asked';
	message: string;
	/** The value that may have been meant. */
	meant: number | null;
}

/** What is likely, and its unit; no law, so that what lies outside is asked about alone. Common practice, no source. */
const likely = {
	currentA: { low: 0.5, high: 2000, unit: 'A', what: 'current' },
	clockMHz: { low: 100, high: 12_000, unit: 'MHz', what: 'clock' }
} as const;

const mostThreads = 4096;

type Measured = keyof typeof likely;

/** A value a thousand times off: brought back, where it then fits the likely range; null where it is not. */
function thousandfold(value: number, field: Measured, middle: number): number | null {
	const { low, high } = likely[field];
	const inRange = (one: number) => one >= low && one <= high;
	const ratio = middle > 0 ? value / middle : 1;
	if (!inRange(value)) return [value * 1000, value / 1000].find(inRange) ?? null;
	if (ratio > 300 && inRange(value / 1000)) return value / 1000;
	if (ratio < 1 / 300 && inRange(value * 1000)) return value * 1000;
	return null;
}

function ofThreads(points: readonly SweepPoint[], row: number): SweepFinding[] {
	const refused = (message: string): SweepFinding[] => [
		{ row, field: 'threads', kind: 'refused', message, meant: null }
	];
	const threads = points[row]?.threads ?? NaN;
	if (!Number.isInteger(threads) || threads < 1 || threads > mostThreads)
		return refused(`Threads are a whole number from 1 to ${printed(mostThreads)}.`);
	const same = points.findIndex((point) => point.threads === threads);
	if (same < row) return refused(`Row ${same + 1} has as many threads. Send a repeat as a pass of its own.`);
	const before = points[row - 1]?.threads ?? 0;
	return threads < before
		? refused(
				`Row ${row} has ${printed(before)} threads, so this row has more. Threads rise from row to row.`
			)
		: [];
}

function ofMeasured(value: number, row: number, field: Measured, middle: number): SweepFinding[] {
	const { low, high, unit, what } = likely[field];
	const least = field === 'currentA' ? 'zero or more' : 'above zero';
	const impossible = !Number.isFinite(value) || value < 0 || (value === 0 && field === 'clockMHz');
	if (impossible)
		return [{ row, field, kind: 'refused', message: `The ${what} is a number, ${least}.`, meant: null }];
	const meant = thousandfold(value, field, middle);
	const written = printedWithUnit(value, unit);
	if (meant !== null)
		return [
			{ row, field, kind: 'asked', message: `${written}: is ${printedWithUnit(meant, unit)} meant?`, meant }
		];
	// Nearly no load draws nearly no current.
	if (value > high || (value < low && field === 'clockMHz')) {
		const message = `${written} is outside the usual ${printed(low)} to ${printed(high)} ${unit}. Is it as measured?`;
		return [{ row, field, kind: 'asked', message, meant: null }];
	}
	return [];
}

/**
 * What is wrong or doubtful in one pass of a sweep, in the order of its rows: threads that do not rise or come twice,
 * values that cannot be (refused); values outside what is likely, or a thousand times off the likely range or the
 * median of the pass, as GHz typed for MHz and mA for A (asked). Form and API share it.
 */
export function checkSweep(points: readonly SweepPoint[]): SweepFinding[] {
	const middle = (field: Measured) => {
		const values = points.map((point) => point[field]).filter(Number.isFinite);
		return values.length > 2 ? median(values) : 0;
	};
	const middles = { currentA: middle('currentA'), clockMHz: middle('clockMHz') };
	return points.flatMap((point, row) => [
		...ofThreads(points, row),
		...ofMeasured(point.currentA, row, 'currentA', middles.currentA),
		...ofMeasured(point.clockMHz, row, 'clockMHz', middles.clockMHz)
	]);
}
