import { sayDay, sayNumber, sayYear } from './say-number';
import { moneySigns, sayUnit, spokenUnits } from './say-unit';

const months = 'January|February|March|April|May|June|July|August|September|October|November|December';
const escape = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');

const number = String.raw`(?:\d{1,3}(?:[\u00a0\u202f\u2009,]\d{3})+|\d+)(?:\.\d+)?`;
const signed = String.raw`[+\u2212-]?${number}`;
const unit = `(?:${spokenUnits.map(escape).join('|')})`;
const space = String.raw`[ \u00a0\u202f]?`;
const before = String.raw`(?<![\p{L}\p{N}.,:/_-])`;
const after = String.raw`(?![\p{L}\p{N}_]|[.,:/-]\d)`;
/** After a unit: a letter would make another word of it, and % needs none. */
const unitEnd = String.raw`(?![\p{L}\p{N}])`;

const date = new RegExp(`${before}(\\d{1,2}) (${months})(?: ((?:19|20)\\d{2}))?${after}`, 'gu');
const inYear = new RegExp(
	`\\b(in|since|of|until|till|by|from|before|after|during|between|and) ((?:19|20)\\d{2})${after}(?!${space}${unit}${unitEnd})`,
	'giu'
);
const money = new RegExp(`${before}([€$£])${space}(${number})${after}`, 'gu');
const times = new RegExp(`${before}[×x](${number})${after}`, 'gu');
const product = new RegExp(
	`${before}(${number})${space}[×x]${space}(${number})(?:${space}(${unit})${unitEnd}|${after})`,
	'gu'
);
const range = new RegExp(
	`${before}(${signed})${space}(?:–|to)${space}(${signed})(?:${space}(${unit})${unitEnd}|${after})`,
	'gu'
);
const single = new RegExp(`${before}(${signed})(?:${space}(${unit})${unitEnd}|${after})`, 'gu');
const version = /(?<![\p{L}\p{N}])(\d+(?:\.\d+){2,})(?![\p{L}\p{N}])/gu;

const signs: [RegExp, string][] = [
	[/\bvs\.?(?=\s)/gi, 'versus'],
	[/\be\.g\.,?/gi, 'for example'],
	[/\bi\.e\.,?/gi, 'that is'],
	[/\bapprox\.?(?=\s)/gi, 'about'],
	[/[≈~](?=\s?[+\u2212-]?\d)/g, 'about '],
	[/±\s?(?=\d)/g, 'plus or minus '],
	[/≥\s?/g, 'at least '],
	[/≤\s?/g, 'at most '],
	[/>\s?(?=\d)/g, 'over '],
	[/<\s?(?=\d)/g, 'under '],
	[/\s?→\s?/g, ' to '],
	[/\s?&\s?/g, ' and ']
];

/** Pieces of the text that are names, and what stands between them. */
function aroundNames(text: string, names: readonly string[]): { text: string; name: boolean }[] {
	const known = names.filter((name) => /\d/.test(name)).sort((a, b) => b.length - a.length);
	if (known.length === 0) return [{ text, name: false }];
	const parts = text.split(new RegExp(`(${known.map(escape).join('|')})`, 'g'));
	return parts.map((part, at) => ({ text: part, name: at % 2 === 1 }));
}

const withUnit = (said: string, figures: string, of: string | undefined): string =>
	of === undefined ? said : `${said} ${sayUnit(of, figures)}`;

function sayPiece(text: string): string {
	const marked = signs.reduce((words, [sign, instead]) => words.replace(sign, instead), text);
	return marked
		.replace(version, (all: string) => all.split('.').map(sayNumber).join(' point '))
		.replace(date, (_, day: string, month: string, year?: string) =>
			[`${sayDay(Number(day))} of ${month}`, ...(year ? [sayYear(Number(year))] : [])].join(' ')
		)
		.replace(inYear, (_, word: string, year: string) => `${word} ${sayYear(Number(year))}`)
		.replace(money, (_, sign: string, figures: string) =>
			withUnit(sayNumber(figures.replace(/\.00$/, '')), figures.replace(/\.00$/, ''), moneySigns[sign])
		)
		.replace(product, (_, one: string, other: string, of?: string) =>
			withUnit(`${sayNumber(one)} by ${sayNumber(other)}`, other, of)
		)
		.replace(times, (_, figures: string) => `${sayNumber(figures)} times`)
		.replace(range, (_, low: string, high: string, of?: string) =>
			withUnit(`${sayNumber(low)} to ${sayNumber(high)}`, high, of)
		)
		.replace(single, (_, figures: string, of?: string) => withUnit(sayNumber(figures), figures, of));
}

/**
 * A sentence as a narrator says it: numbers with their units, ranges, signs, dates, years and prices in words.
 * Names that hold digits, such as a part's, stay as they are written, for the narrator knows how theirs are said;
 * so do times of the day and what is not clearly a number.
 * @example say('It draws 3–5 % less at 4.95 GHz') === 'It draws three to five percent less at four point nine five gigahertz'
 */
export const say = (text: string, names: readonly string[] = []): string =>
	aroundNames(text, names)
		.map((part) => (part.name ? part.text : sayPiece(part.text)))
		.join('')
		.replace(/[\u00a0\u202f\u2009]/g, ' ')
		.replace(/ {2,}/g, ' ')
		.trim();
