import { toCardinal, toOrdinal } from 'n2words/en-GB';

const digits = ['zero', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine'];
const spell = (figures: string): string =>
	[...figures].map((figure) => digits[Number(figure)] ?? figure).join(' ');

/**
 * A number as a person says it: the whole as one, the decimals digit by digit, a sign as a word. Thousands may be
 * apart by a comma or an unbreakable space.
 * @param text digits as printed; RangeError for what is no number
 * @example sayNumber('−4.60') === 'minus four point six zero'; sayNumber('12 450') // with an unbreakable space: 'twelve thousand four hundred and fifty'
 */
export function sayNumber(text: string): string {
	const plain = text.replace(/[\u00a0\u202f\u2009,]/g, '').replace('\u2212', '-');
	const [, sign = '', whole = '', fraction] = /^([+-]?)(\d+)(?:\.(\d+))?$/.exec(plain) ?? [];
	if (whole === '') throw new RangeError(`“${text}” is no number that can be said.`);
	const said = whole.length > 15 ? spell(whole) : toCardinal(Number(whole));
	return [
		sign === '' ? '' : sign === '-' ? 'minus' : 'plus',
		said,
		fraction === undefined ? '' : `point ${spell(fraction)}`
	]
		.filter((part) => part !== '')
		.join(' ');
}

/** A year in pairs. @example sayYear(2026) === 'twenty twenty-six'; sayYear(1905) === 'nineteen oh five' */
export function sayYear(year: number): string {
	const [century, rest] = [Math.floor(year / 100), year % 100];
	if (century % 10 === 0 && rest < 10) return toCardinal(year);
	if (rest === 0) return `${toCardinal(century)} hundred`;
	return `${toCardinal(century)} ${rest < 10 ? `oh ${toCardinal(rest)}` : toCardinal(rest)}`;
}

/** A day of a month. @example sayDay(14) === 'the fourteenth' */
export const sayDay = (day: number): string => `the ${toOrdinal(day)}`;
