import { printed, printedWithUnit } from '../../shared/quantity';
import type { AttemptOutcome, StressKind } from './words';

/** One try of one stress at one setting. */
export interface Attempt {
	clockMHz: number;
	/** Core voltage. */
	volts: number;
	/** Slug of the stress. */
	stress: string;
	stressKind: StressKind;
	/** How long it ran; on a failure, until then. */
	durationMin: number;
	outcome: AttemptOutcome;
	/** What was seen when it failed, in words; empty unless it did. */
	failure: string;
	/** Errors that the stress itself counted. */
	errors: number;
	peakTempC: number | null;
	packageW: number | null;
	/** When it began, as ISO time. */
	at: string;
}

/** What is usually seen when an attempt fails, for a form to offer; other words are as good. Common practice, no source. */
export const usualFailures = [
	'did not start',
	'crash',
	'freeze',
	'restart',
	'error',
	'throttle',
	'too hot'
] as const;

export const stressKindWords: Record<StressKind, string> = {
	heaviest: 'heaviest load',
	everyday: 'everyday load'
};

export const outcomeWords: Record<AttemptOutcome, string> = {
	passed: 'passed',
	failed: 'failed',
	stopped: 'stopped by hand'
};

/** A clock and its voltage in print. @example settingWords({ clockMHz: 4900, volts: 1.25 }) // '4900 MHz at 1.25 V' */
export const settingWords = ({ clockMHz, volts }: Pick<Attempt, 'clockMHz' | 'volts'>): string =>
	`${printedWithUnit(clockMHz, 'MHz')} at ${printedWithUnit(volts, 'V')}`;

/**
 * An attempt in one line.
 * @example attemptWords(attempt) // '4900 MHz at 1.25 V: failed after 12 min, error (3 counted)'
 */
export function attemptWords(attempt: Attempt): string {
	const { durationMin, errors, failure, outcome } = attempt;
	const cause = failure === '' ? '' : `, ${failure}`;
	const counted = errors > 0 ? ` (${printed(errors)} counted)` : '';
	return `${settingWords(attempt)}: ${outcomeWords[outcome]} after ${printedWithUnit(durationMin, 'min')}${cause}${counted}`;
}
