import { printed, printedWithUnit } from '../../shared/quantity';
import { positive } from '../tuning/positive';
import { type Attempt, settingWords } from './attempt';
import { boundsAt } from './bounds-at';
import type { Demands } from './verdict';

export interface Limits {
	clockMHz: number;
	volts: number;
	tempC: number;
	/** Whose limits they are, such as the maker's data sheet or a rule of the lab. */
	source: string;
}

export interface Climb {
	attempts: readonly Attempt[];
	/** Slug of the stress that is climbed. */
	stress: string;
	demands: Demands;
	/** The voltage to try at. */
	volts: number;
	/** The board's own step. */
	stepMHz: number;
	/** How far to go at once while nothing has failed, or nothing passed. */
	strideMHz: number;
	/** Where to begin without any attempt. */
	startMHz: number;
	limits: Limits;
	/** Kelvin to stay under the limit of temperature; 5 unless said (common practice, no source). */
	headroomK?: number;
}

export type NextAttempt =
	| { kind: 'try'; clockMHz: number; volts: number; words: string }
	| { kind: 'done'; passedMHz: number | null; failedMHz: number; words: string }
	| { kind: 'refused'; limit: 'clock' | 'voltage' | 'temperature'; words: string };

interface Idea {
	clockMHz: number;
	/** The clock that the board's steps are counted from. */
	from: number;
	why: string;
}

const mhz = (clock: number) => printedWithUnit(clock, 'MHz');
/** Sums of steps that are no binary fractions, back on the grid. */
const tidy = (clock: number) => Math.round(clock * 1e6) / 1e6;
const grain = 1e-9;

function idea(climb: Climb): Idea | Extract<NextAttempt, { kind: 'done' }> {
	const { stepMHz: step, volts } = climb;
	const { passed, failed } = boundsAt(climb.attempts, climb);
	const stride = Math.max(1, Math.round(climb.strideMHz / step)) * step;
	if (!failed) {
		return passed
			? {
					clockMHz: passed.clockMHz + stride,
					from: passed.clockMHz,
					why: `Nothing has failed yet: up from ${settingWords(passed)}, which passed.`
				}
			: {
					clockMHz: climb.startMHz,
					from: climb.startMHz,
					why: 'Nothing here has passed or failed yet: the clock to begin with.'
				};
	}
	const failedMHz = failed.clockMHz;
	if (!passed) {
		return failedMHz - stride > 0
			? {
					clockMHz: failedMHz - stride,
					from: failedMHz,
					why: `Nothing has passed yet: down from ${settingWords(failed)}, which failed.`
				}
			: {
					kind: 'done',
					passedMHz: null,
					failedMHz,
					words: `Nothing passed, down to ${settingWords(failed)}. The clock is not the cause: check the rig at stock.`
				};
	}
	const steps = (failedMHz - passed.clockMHz) / step;
	if (steps <= 1 + grain) {
		return {
			kind: 'done',
			passedMHz: passed.clockMHz,
			failedMHz,
			words: `Done at ${printedWithUnit(volts, 'V')}: ${settingWords(passed)} passed, ${settingWords(failed)} failed, and the board has no step between.`
		};
	}
	return {
		clockMHz: passed.clockMHz + Math.max(1, Math.floor(steps / 2 + grain)) * step,
		from: passed.clockMHz,
		why: `Half way between ${settingWords(passed)}, which passed, and ${settingWords(failed)}, which failed.`
	};
}

/** The idea's clock brought under the limit in the board's steps; null where that leads back to where it began. */
function under(limit: number, { clockMHz, from }: Idea, step: number): number | null {
	if (clockMHz <= limit) return tidy(clockMHz);
	const steps = Math.floor((limit - from) / step + grain);
	return (steps >= 1 || from > limit) && from !== clockMHz ? tidy(from + steps * step) : null;
}

/** The hottest attempt at no more clock and no more voltage; more of either is hotter. */
function hottest(
	{ attempts, stress, volts }: Climb,
	clockMHz: number
): { one: Attempt; tempC: number } | null {
	const near = attempts.flatMap((one) =>
		one.stress === stress && one.clockMHz <= clockMHz && one.volts <= volts && one.peakTempC !== null
			? [{ one, tempC: one.peakTempC }]
			: []
	);
	return near.sort((a, b) => b.tempC - a.tempC)[0] ?? null;
}

/** What a person should know beside the reason. */
function remarks(climb: Climb, clockMHz: number, temperatureKnown: boolean): string {
	const { overruled, failed } = boundsAt(climb.attempts, climb);
	const again = climb.attempts.some(
		(one) => one.stress === climb.stress && one.clockMHz === clockMHz && one.volts === climb.volts
	);
	return [
		overruled.length > 0 && failed
			? ` A pass above ${settingWords(failed)} is left out, since that failed: repeat it, or void what was wrong.`
			: '',
		again ? ' It was tried before, but not for as long as the stress demands.' : '',
		temperatureKnown ? '' : ' No temperature is known up to here: watch it.'
	].join('');
}

/**
 * The next clock to try at a voltage, by bisection in the board's steps between the highest pass and the lowest fail;
 * before any fail up by the stride, before any pass down by it; done when no step lies between. Never over a limit:
 * a clock is brought under it, and where nothing is left to try, or a cooler attempt was already within the headroom of
 * the limit of temperature, it is refused with whose limit it is. RangeError for settings that are not above zero.
 * @example nextAttempt(climb) // { kind: 'try', clockMHz: 4850, volts: 1.25, words: 'Half way between …' }
 */
export function nextAttempt(climb: Climb): NextAttempt {
	const { limits, volts, stepMHz, headroomK = 5 } = climb;
	positive(volts, 'voltage');
	positive(stepMHz, "board's step");
	positive(climb.strideMHz, 'stride');
	positive(climb.startMHz, 'clock to begin with');
	const whose = `(${limits.source})`;
	if (volts > limits.volts) {
		const words = `${printedWithUnit(volts, 'V')} is over the limit of ${printedWithUnit(limits.volts, 'V')} ${whose}. Choose a lower voltage.`;
		return { kind: 'refused', limit: 'voltage', words };
	}
	const next = idea(climb);
	if ('kind' in next) return next;
	const clockMHz = under(limits.clockMHz, next, stepMHz);
	if (clockMHz === null || clockMHz <= 0) {
		const words = `${next.why} That is over the limit of ${mhz(limits.clockMHz)} ${whose}. ${next.from === next.clockMHz ? 'Begin lower.' : 'There is nothing further to try under it.'}`;
		return { kind: 'refused', limit: 'clock', words };
	}
	const hot = hottest(climb, clockMHz);
	if (hot && hot.tempC >= limits.tempC - headroomK) {
		const words = `${settingWords(hot.one)} already reached ${printedWithUnit(hot.tempC, '°C')}. The limit is ${printedWithUnit(limits.tempC, '°C')} ${whose}, of which ${printed(headroomK)} K are kept free. Lower the voltage or cool better before ${mhz(clockMHz)}.`;
		return { kind: 'refused', limit: 'temperature', words };
	}
	const capped =
		clockMHz < tidy(next.clockMHz) ? ` Kept under the limit of ${mhz(limits.clockMHz)} ${whose}.` : '';
	return {
		kind: 'try',
		clockMHz,
		volts,
		words: `${next.why}${capped}${remarks(climb, clockMHz, hot !== null)}`
	};
}
