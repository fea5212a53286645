import { verdictWords, type Comparison, type Summary, type WorkloadFacts } from '../bench/figures';
import {
	halfWidthOf,
	printed,
	printedGain,
	printedGainRange,
	printedRange,
	withUnit,
	type Precision
} from '../shared/quantity';

/** How far the figures of one cell are printed: to the second digit of its interval's half width. */
export const precisionOf = (summary: Summary): Precision => ({ halfWidth: halfWidthOf(summary.ci95) });

/** The average a workload's protocol puts in print, or the one asked for, with its unit. */
export function printedAverage(
	summary: Summary,
	workload: Pick<WorkloadFacts, 'unit'>,
	which: 'mean' | 'median' | 'headline' = 'headline'
): string {
	return withUnit(printed(summary[which], precisionOf(summary)), workload.unit);
}

/** The 95 % interval of the mean with its unit; null for a single reading. */
export const printedInterval = (summary: Summary, workload: Pick<WorkloadFacts, 'unit'>): string | null =>
	summary.ci95 && withUnit(printedRange(summary.ci95, precisionOf(summary)), workload.unit);

/** How many readings a figure rests on. @example readingsInWords(7) === '7 readings' */
export const readingsInWords = (n: number): string => (n === 1 ? '1 reading' : `${n} readings`);

/** What stands behind a printed reading: how many, and how sure. */
export function behindReading(summary: Summary, workload: WorkloadFacts): string {
	const interval = printedInterval(summary, workload);
	return interval
		? `${readingsInWords(summary.n)}, 95 % interval ${interval}`
		: `${readingsInWords(summary.n)}, too few for an interval`;
}

/** What stands behind a printed gain: its interval, and what it means against the least difference that matters. */
export function behindGain(comparison: Comparison, workload: WorkloadFacts, over: string): string {
	const interval = comparison.gainCi95
		? `95 % interval ${printedGainRange(comparison.gainCi95)}`
		: 'too few readings for an interval';
	const least = withUnit(printed(workload.leastDifferencePercent), '%');
	return `over ${over}: ${verdictWords[comparison.verdict]}; ${interval}; differences under ${least} do not matter here`;
}

/** A gain as words that keep their truth when the data move. @example '12.4 % better' */
export function gainInWords(comparison: Comparison): string {
	const gain = printedGain(comparison.gainPercent, comparison.gainCi95);
	if (comparison.verdict === 'no-difference') return `no different (${gain})`;
	const doubt = comparison.verdict === 'not-enough' ? ` (${verdictWords['not-enough']})` : '';
	const way = comparison.gainPercent < 0 ? 'worse' : 'better';
	const nought = !/[1-9]/.test(gain);
	return `${nought ? 'about the same' : `${printedSize(comparison)} ${way}`}${doubt}`;
}

/** A gain without its sign, for a sentence that says which way. */
export const printedSize = (comparison: Pick<Comparison, 'gainPercent' | 'gainCi95'>): string =>
	printedGain(Math.abs(comparison.gainPercent), comparison.gainCi95).replace('+', '');
