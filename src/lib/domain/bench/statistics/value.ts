import type { Spread } from './sides';
import { coverageFactor, combined, effectiveDf, relativeComponents } from './uncertainty';

/** A figure made from others, with its 95 % interval where the scatter of both is known. */
export interface DerivedFigure {
	value: number;
	/** Standard uncertainty, in the unit of the value; null where a side has a single reading. */
	u: number | null;
	ci95: [number, number] | null;
}

/** A price as it was found. */
export interface DatedPrice {
	/** In whole units of the currency, above zero. */
	amount: number;
	currency: string;
	/** The day it was looked up, ISO; a price without one cannot be judged later. */
	date: string;
}

const aboveZero = (value: number, name: string): void => {
	if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`${name} must be above zero.`);
};

/** A product of two means to the powers given, with relative uncertainty (JCGM 100:2008, 5.1.6), independent sides. */
function product(first: Spread, second: Spread, power: 1 | -1): DerivedFigure {
	const value = first.mean * second.mean ** power;
	if (first.sd === null || second.sd === null) return { value, u: null, ci95: null };
	const components = relativeComponents([
		{ value: first.mean, u: first.sd / Math.sqrt(first.n), df: first.n - 1 },
		{ value: second.mean, u: second.sd / Math.sqrt(second.n), df: second.n - 1, power }
	]);
	const u = combined(components) * value;
	const half = coverageFactor(effectiveDf(components)) * u;
	return { value, u, ci95: [value - half, value + half] };
}

/**
 * Energy of one task, in J: mean power in W × time in s, from separate sets of readings. Where power and time come
 * from one log, integrate the log instead. RangeError for a mean that is not above zero.
 */
export function energyPerTask(powerW: Spread, timeS: Spread): DerivedFigure {
	aboveZero(powerW.mean, 'Power');
	aboveZero(timeS.mean, 'Time');
	return product(powerW, timeS, 1);
}

/** Score for each watt, in the score's unit per W. RangeError for a score or a power that is not above zero. */
export function scorePerWatt(score: Spread, powerW: Spread): DerivedFigure {
	aboveZero(score.mean, 'A score');
	aboveZero(powerW.mean, 'Power');
	return product(score, powerW, -1);
}

/**
 * Score for each unit of money, with the day of its price. The price is taken as exact, so the interval is the
 * score's. RangeError for a score or a price that is not above zero.
 */
export function scorePerPrice(
	score: Spread,
	price: DatedPrice
): DerivedFigure & Pick<DatedPrice, 'currency' | 'date'> {
	aboveZero(score.mean, 'A score');
	aboveZero(price.amount, 'A price');
	const { currency, date } = price;
	return { ...product(score, { n: 2, mean: price.amount, sd: 0 }, -1), currency, date };
}
