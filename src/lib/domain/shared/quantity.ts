import { roundHalfUp } from './round-half-up';

/**
 * Printed rounding. Every figure on a page, in a plate or in a table passes through here, once, from the
 * stored value; nothing is rounded before it is stored and nothing printed is rounded again.
 *
 * Halves go away from zero (ISO 80000-1 Annex B, rule B), on the decimal digits of the number, because
 * binary rounding turns 2.675 into 2.67. How many digits: at most two significant digits of the
 * uncertainty, and the value to the same place (JCGM 100:2008, 7.2.6).
 */

const MINUS = '\u2212';
/** Unbreakable, so that a number never ends a line half way; U+202F would be thinner, but closes up in our faces. */
const GROUP = '\u00a0';
const UNIT_SPACE = '\u00a0';

/** How far to print. `decimals` wins; else the half width of an interval decides; else the value's own digits. */
export interface Precision {
	decimals?: number;
	halfWidth?: number | null;
}

/** Power of ten of the first significant digit. @example exponentOf(4686.7) === 3 */
const exponentOf = (value: number): number => Number(Math.abs(value).toExponential().split('e')[1]);

/** Places behind the point of the number's own shortest decimal digits. @example placesOf(0.125) === 3 */
function placesOf(value: number): number {
	const [mantissa = '0', exponent = '0'] = value.toExponential().split('e');
	return (mantissa.split('.')[1] ?? '').length - Number(exponent);
}

/**
 * Rounds on the decimal digits, halves away from zero, and returns plain digits with an ASCII point and minus.
 * Negative decimals round to tens, hundreds … Refuses what is not finite.
 * @example roundedDecimal(2.675, 2) === '2.68'; roundedDecimal(1225, -1) === '1230'
 */
export function roundedDecimal(value: number, decimals: number): string {
	if (!Number.isFinite(value)) throw new RangeError('Only a finite number can be printed.');
	return roundHalfUp(value.toExponential(), decimals);
}

/** Half the width of an interval; null where there is none. Unit: that of its ends. */
export const halfWidthOf = (interval: readonly [number, number] | null | undefined): number | null =>
	interval ? Math.abs(interval[1] - interval[0]) / 2 : null;

/**
 * Decimals to print a value with. From a half width: the place of its second significant digit, but never
 * fewer than two digits of the value itself. Without one: the value's own, six significant digits at most
 * (common practice, no source).
 * @example decimalsFor(4686.724, { halfWidth: 65.18 }) === 0; decimalsFor(10.05762, { halfWidth: 0.027 }) === 3
 */
export function decimalsFor(value: number, { decimals, halfWidth }: Precision = {}): number {
	if (decimals !== undefined) return decimals;
	const first = value === 0 ? 0 : exponentOf(value);
	if (!halfWidth || !Number.isFinite(halfWidth)) {
		return Math.max(0, Math.min(placesOf(value), 5 - first));
	}
	// Rounded to two digits before its place is read: 9.96 is 10, so its second digit is the ones.
	const place = 1 - exponentOf(Number(halfWidth.toPrecision(2)));
	return value === 0 ? place : Math.max(place, 1 - first);
}

/** Digits as they stand in print: a true minus, spaces between thousands from five digits on. */
function set(plain: string, signed: boolean): string {
	const negative = plain.startsWith('-');
	const [whole = '0', fraction] = plain.replace('-', '').split('.');
	const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, GROUP) : whole;
	const zero = /^[0.]+$/.test(plain);
	const sign = negative ? MINUS : signed && !zero ? '+' : '';
	return sign + grouped + (fraction === undefined ? '' : `.${fraction}`);
}

/**
 * A number in print.
 * @example printed(4686.72428571, { halfWidth: 65.18 }) === '4687'; printed(-4.56, { decimals: 1 }) === '−4.6'
 */
export const printed = (value: number, precision: Precision = {}): string =>
	set(roundedDecimal(value, decimalsFor(value, precision)), false);

/** A number in print with its sign, + included; nought has none. @example printedSigned(12.44, { decimals: 1 }) === '+12.4' */
export const printedSigned = (value: number, precision: Precision = {}): string =>
	set(roundedDecimal(value, decimalsFor(value, precision)), true);

/** A printed number and its unit, an unbreakable space between them, before % too (SI Brochure 5.4.3); none before ° alone. */
export const withUnit = (text: string, unit: string): string =>
	unit === '' ? text : unit === '°' ? text + unit : text + UNIT_SPACE + unit;

/** @example printedWithUnit(31.2, 's') === '31.2 s' */
export const printedWithUnit = (value: number, unit: string, precision: Precision = {}): string =>
	withUnit(printed(value, precision), unit);

/** Both ends to one place, in words because a dash beside a minus misleads. @example printedRange([-5.04, -4.2], { decimals: 1 }) === '−5.0 to −4.2' */
export function printedRange(
	[low, high]: readonly [number, number],
	precision: Precision = {},
	options: { signed?: boolean } = {}
): string {
	const decimals = decimalsFor((low + high) / 2, { halfWidth: (high - low) / 2, ...precision });
	const one = options.signed ? printedSigned : printed;
	return `${one(low, { decimals })} to ${one(high, { decimals })}`;
}

/** Decimals of a percentage: one, or none where its interval is wider than ten to a side (common practice, no source). */
export const percentDecimals = (interval?: readonly [number, number] | null): number => {
	const half = halfWidthOf(interval);
	return half !== null && half >= 10 ? 0 : 1;
};

/** A gain in percent with its sign. @example printedGain(12.43, [11.8, 13]) === '+12.4 %' */
export const printedGain = (gainPercent: number, interval?: readonly [number, number] | null): string =>
	withUnit(printedSigned(gainPercent, { decimals: percentDecimals(interval) }), '%');

/** The interval of a gain. @example printedGainRange([-5.04, -4.2]) === '−5.0 to −4.2 %' */
export const printedGainRange = (interval: readonly [number, number]): string =>
	withUnit(printedRange(interval, { decimals: percentDecimals(interval) }, { signed: true }), '%');

/** A percentage without a sign of its own, such as a coefficient of variation. @example printedPercent(1.50378) === '1.5 %' */
export const printedPercent = (percent: number, decimals = 1): string =>
	withUnit(printed(percent, { decimals }), '%');

/** A ratio, three decimals. @example printedRatio(1.0752429725) === '1.075' */
export const printedRatio = (ratio: number): string => printed(ratio, { decimals: 3 });
