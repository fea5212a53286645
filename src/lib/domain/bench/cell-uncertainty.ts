import { type Calibrated, calibrationState, calibrationWords } from './calibration';
import type { Summary } from './figures';
import { ofInstrument, ofResolution } from './statistics/instrument';
import { roundToUncertainty } from './statistics/round-to-uncertainty';
import { type Component, type Expanded, expand } from './statistics/uncertainty';

/** What a column's figures are read from. */
export interface InstrumentFacts extends Calibrated {
	name: string;
	unit: string;
	/** Limits of error: ± this share of the reading plus ± this much in the unit. */
	accuracyPercent: number;
	accuracyAbsolute: number;
	/** The last digit it shows, in the unit. */
	resolution: number;
}

export interface CellUncertainty extends Expanded {
	/** Scatter of the mean (type A), and the instrument's error with its display (type B); standard uncertainties. */
	typeA: number;
	typeB: number;
	/** Value and expanded uncertainty to the digits that it supports; null where nothing is uncertain. */
	printed: { value: string; uncertainty: string } | null;
	instrument: string;
	calibration: string;
	/** Whether the calibration had run out on the day. */
	overdue: boolean;
}

const typeBOf = (mean: number, instrument: InstrumentFacts): Component[] => [
	{
		u: ofInstrument(mean, {
			percentOfReading: instrument.accuracyPercent,
			fixed: instrument.accuracyAbsolute
		})
	},
	{ u: ofResolution(instrument.resolution) }
];

/**
 * Uncertainty of a cell's mean by the GUM: the scatter of its readings (type A, s/√n) with the accuracy and the
 * resolution of its instrument (type B, rectangular), and the value to the digits that it supports. Null below two
 * readings, or where the instrument reads in another unit. Source: JCGM 100:2008, 4.2, 4.3, 5.1.2 and G.4.
 * @param day ISO day on which it was measured, for the calibration
 */
export function cellUncertainty(
	summary: Pick<Summary, 'n' | 'mean' | 'sd'>,
	unit: string,
	instrument: InstrumentFacts,
	day: string
): CellUncertainty | null {
	if (summary.sd === null || instrument.unit.trim() !== unit.trim()) return null;
	const typeA = { u: summary.sd / Math.sqrt(summary.n), df: summary.n - 1 };
	const typeB = typeBOf(summary.mean, instrument);
	const whole = expand([typeA, ...typeB]);
	return {
		...whole,
		typeA: typeA.u,
		typeB: expand(typeB).u,
		printed: whole.expanded > 0 ? roundToUncertainty(summary.mean, whole.expanded) : null,
		instrument: instrument.name,
		calibration: calibrationWords(instrument, day),
		overdue: calibrationState(instrument, day) === 'overdue'
	};
}
