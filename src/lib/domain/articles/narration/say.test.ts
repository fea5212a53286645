import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { printed } from '../../shared/quantity';
import { say } from './say';
import { sayNumber, sayYear } from './say-number';

describe('a number as it is said', () => {
	// Number names of the British standard reading, as n2words (an independent library) gives them for whole numbers;
	// decimals digit by digit, as the New Hart's Rules advise for speech (from memory).
	it.each([
		['0', 'zero'],
		['4.95', 'four point nine five'],
		['12.40', 'twelve point four zero'],
		['1284', 'one thousand two hundred and eighty-four'],
		['1,284', 'one thousand two hundred and eighty-four'],
		['12\u00a0450', 'twelve thousand four hundred and fifty'],
		['\u22123.4', 'minus three point four'],
		['+9', 'plus nine'],
		['1000000', 'one million']
	])('%s: %s', (text, words) => expect(sayNumber(text)).toBe(words));

	it('refuses what is none', () => {
		for (const text of ['', '1.2.3', 'four', '1e5']) expect(() => sayNumber(text)).toThrow(RangeError);
	});

	it('can be said of whatever we print, without a digit left', () => {
		fc.assert(
			fc.property(
				fc.double({ min: -1e9, max: 1e9, noNaN: true }),
				fc.integer({ min: 0, max: 4 }),
				(value, decimals) => {
					expect(say(`Now ${printed(value, { decimals })}\u00a0W.`)).toMatch(/^Now [a-z -]+ watts?\.$/);
				}
			)
		);
	});

	it('reads years in pairs', () => {
		expect([2026, 1999, 2000, 2005, 1900, 1905, 2100].map(sayYear)).toEqual([
			'twenty twenty-six',
			'nineteen ninety-nine',
			'two thousand',
			'two thousand and five',
			'nineteen hundred',
			'nineteen oh five',
			'twenty-one hundred'
		]);
	});
});

describe('a sentence as it is said', () => {
	it.each([
		[
			'It ends in 31.2\u00a0s, 12.4\u00a0% faster.',
			'It ends in thirty-one point two seconds, twelve point four percent faster.'
		],
		['between 3–5 % more', 'between three to five percent more'],
		['\u22125.0 to \u22124.2\u00a0%', 'minus five point zero to minus four point two percent'],
		['at 1 W and 2 W, 0.5 K/W', 'at one watt and two watts, zero point five kelvins per watt'],
		['6000 MT/s at 21 °C', 'six thousand megatransfers per second at twenty-one degrees Celsius'],
		['on 14 November 2026', 'on the fourteenth of November twenty twenty-six'],
		['since 2024', 'since twenty twenty-four'],
		['a score of 2026 points', 'a score of two thousand and twenty-six points'],
		['It costs €549.00, or $1.', 'It costs five hundred and forty-nine euros, or one dollar.'],
		['×1.25, or 1.25×', 'one point two five times, or one point two five times'],
		[
			'≈ 40 dB(A), ±0.5 °C',
			'about forty decibels, A-weighted, plus or minus zero point five degrees Celsius'
		],
		['firmware 2.20.1 vs. 2.1', 'firmware two point twenty point one versus two point one'],
		['2 × 16 GiB', 'two by sixteen gibibytes']
	])('%s', (text, words) => expect(say(text)).toBe(words));

	it('leaves names, times of the day and words with digits as they are', () => {
		expect(say('The Aldermoor 1650 ran at 15:00 with DDR5 and N-12.', ['Aldermoor 1650', 'N-12'])).toBe(
			'The Aldermoor 1650 ran at 15:00 with DDR5 and N-12.'
		);
	});
});
