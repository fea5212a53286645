import { roundedDecimal } from '../../shared/quantity';

/** A number as it was printed: its digits with a point, how far it goes, and what it is. */
export interface Decimal {
	/** Plain digits, ASCII minus and point. */
	text: string;
	/** Places behind the point; negative where a word such as “million” moved them. */
	places: number;
	value: number;
}

/** @example decimalOf('12.40') // { text: '12.40', places: 2, value: 12.4 } */
export function decimalOf(text: string, power = 0): Decimal {
	const places = (text.split('.')[1] ?? '').length - power;
	const value = Number(`${text}e${power}`);
	return { text: power === 0 ? text : String(value), places, value };
}

/** Whether a stored value rounds to a printed number at the places it is printed with, halves away from zero. */
export function roundsTo(stored: number, { value, places }: Decimal): boolean {
	if (!Number.isFinite(stored) || Math.abs(places) > 20) return false;
	return Number(roundedDecimal(stored, places)) === value;
}

/** The same with the sign put aside. */
export const sizeRoundsTo = (stored: number, printed: Decimal): boolean =>
	roundsTo(Math.abs(stored), { ...printed, value: Math.abs(printed.value) });

/** The place of the last digit that is not a nought before the point: 4700 goes to hundreds, 2; 31.2 to tenths, −1. */
export function lastPlace({ text, places }: Decimal): number {
	if (places > 0) return -places;
	const noughts = /0*$/.exec(text.replace(/^-/, ''))?.[0].length ?? 0;
	return Math.max(-places, Math.min(noughts, text.replace(/\D/g, '').length - 1));
}

/** How a number says how sure it is. */
export type Hedge = 'about' | 'nearly' | 'over' | 'under' | null;

/** A number with a word such as “about” before it may lie this far from the stored one, as a share of itself. */
export const aboutShare = 0.05;
/** And one with “nearly” or “over” this far, to its own side (both: common practice, no source). */
export const sideShare = 0.1;

/**
 * Whether a stored value agrees with a printed number: rounded to its places, or within what its hedge allows.
 * “About” allows 5 % or half of its last place that is no nought; “nearly” up to 10 % below it; “under” and “over”
 * what they say, up to half as much again.
 * @example agrees(31.2, decimalOf('31'), null) === true; agrees(31.2, decimalOf('30'), 'about') === true
 */
export function agrees(stored: number, printed: Decimal, hedge: Hedge): boolean {
	if (roundsTo(stored, printed)) return true;
	if (hedge === null || stored * printed.value < 0) return false;
	const [have, said] = [Math.abs(stored), Math.abs(printed.value)];
	switch (hedge) {
		case 'about':
			return Math.abs(have - said) <= Math.max(said * aboutShare, 0.5 * 10 ** -printed.places);
		case 'nearly':
			return have < said && have >= said * (1 - sideShare);
		case 'over':
			return have > said && have <= said * 1.5;
		case 'under':
			return have < said && have >= said / 1.5;
	}
}
