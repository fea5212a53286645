import { printed, printedWithUnit } from '../../shared/quantity';

export const stressKinds = ['heaviest', 'everyday'] as const;
/** Whether a stress loads the part as nothing else does, or as work and play do. */
export type StressKind = (typeof stressKinds)[number];

export const attemptOutcomes = ['passed', 'failed', 'stopped'] as const;
/** How an attempt ended; stopped by hand says nothing either way. */
export type AttemptOutcome = (typeof attemptOutcomes)[number];

export const failures = [
	'no-start',
	'crash',
	'freeze',
	'restart',
	'error',
	'throttle',
	'too-hot',
	'other'
] as const;
/** What was seen first when an attempt failed. */
export type Failure = (typeof failures)[number];

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
	/** Null unless it failed. */
	failure: Failure | null;
	/** Errors that the stress itself counted. */
	errors: number;
	peakTempC: number | null;
	packageW: number | null;
	/** ISO time, all in one zone. */
	at: string;
}

export const stressKindWords: Record<StressKind, string> = {
	heaviest: 'heaviest load',
	everyday: 'everyday load'
};

export const outcomeWords: Record<AttemptOutcome, string> = {
	passed: 'passed',
	failed: 'failed',
	stopped: 'stopped by hand'
};

export const failureWords: Record<Failure, string> = {
	'no-start': 'did not start',
	crash: 'program crashed',
	freeze: 'froze',
	restart: 'restarted by itself',
	error: 'wrong results',
	throttle: 'throttled',
	'too-hot': 'too hot',
	other: 'other'
};

/** A clock and its voltage in print. @example settingWords({ clockMHz: 4900, volts: 1.25 }) // '4900 MHz at 1.25 V' */
export const settingWords = ({ clockMHz, volts }: Pick<Attempt, 'clockMHz' | 'volts'>): string =>
	`${printedWithUnit(clockMHz, 'MHz')} at ${printedWithUnit(volts, 'V')}`;

/**
 * An attempt in one line.
 * @example attemptWords(attempt) // '4900 MHz at 1.25 V: failed after 12 min, wrong results (3 errors)'
 */
export function attemptWords(attempt: Attempt): string {
	const { durationMin, errors, failure, outcome } = attempt;
	const cause = outcome === 'failed' && failure ? `, ${failureWords[failure]}` : '';
	const counted = errors > 0 ? ` (${errors === 1 ? '1 error' : `${printed(errors)} errors`})` : '';
	return `${settingWords(attempt)}: ${outcomeWords[outcome]} after ${printedWithUnit(durationMin, 'min')}${cause}${counted}`;
}
