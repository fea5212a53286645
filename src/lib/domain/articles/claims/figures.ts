import { decimalOf, type Decimal, type Hedge } from './decimal';
import { foldWords, ratioWords, spelled, spelledValue, wordRatio, type WordRatio } from './number-words';
import type { NotClaim, Shield } from './not-claims';
import { blank, currencyBefore, type Quantity, type UnitReader } from './prose-units';

/** A number found in a passage, with its unit and what it says of itself. */
export interface Figure {
	/** Indices into the passage: the number with its sign and unit, and where the number alone ends. */
	from: number;
	to: number;
	numberTo: number;
	/** The ways its digits can be read, the likelier first. */
	readings: Decimal[];
	/** The upper end, where it is a range. */
	high: Decimal | null;
	/** What stands behind ±. */
	margin: Decimal | null;
	hedge: Hedge;
	sign: 1 | -1 | null;
	quantity: Quantity;
	/** The word that is the number, such as twice or a third. */
	word: WordRatio | null;
	/** Why it is no measured claim; null where it is one. */
	not: NotClaim | null;
}

const digits = [
	`\\d{1,3}(?:[\\u00a0\\u2007\\u2009\\u202f]\\d{3})+(?:[.,]\\d+)?`,
	`[1-9]\\d{0,2}(?: \\d{3})+(?![\\d])(?:[.,]\\d+)?`,
	`[1-9]\\d{0,2}(?:,\\d{3})+(?:\\.\\d+)?(?![\\d])`,
	`[1-9]\\d{0,2}(?:\\.\\d{3}){2,}(?:,\\d+)?(?![\\d])`,
	`[1-9]\\d{0,2}(?:['’]\\d{3})+(?:\\.\\d+)?(?![\\d])`,
	`\\d+(?:[.,]\\d+)?`
].join('|');
const number = `(?:${digits})`;
const scanner = new RegExp(
	`(?<![\\p{L}\\p{N}_]|\\p{L}-|\\d[.,:]|[/\\\\])(${number})|(?<![\\p{L}\\p{N}-])(?:(${foldWords}|${ratioWords}|½|¼)|(${spelled}))(?![\\p{L}])`,
	'giu'
);

const hedges: [RegExp, Hedge][] = [
	[
		/(?:just|well|a little|slightly|somewhat)? ?(?:over|above|more than|upwards of|better than|in excess of)$/i,
		'over'
	],
	[/(?:at least|no less than|not less than)$/i, 'over'],
	[
		/(?:nearly|almost|not quite|close to|just under|just below|a little under|a little less than|all but)$/i,
		'nearly'
	],
	[
		/(?:about|around|roughly|approximately|some|circa|ca\.|c\.|approx\.|or so|~|≈|in the region of|of the order of)$/i,
		'about'
	],
	[/(?:under|below|less than|fewer than|at most|no more than|within)$/i, 'under']
];
const hedgeOf = (before: string): Hedge => hedges.find(([pattern]) => pattern.test(before))?.[1] ?? null;

/** The ways digits can be read: by point and comma, as thousands or as decimals. */
export function readingsOf(text: string, power = 0): Decimal[] {
	const bare = text.replace(/[\s\u00a0\u2007\u2009\u202f'’]/g, '');
	const plain = (decimals: string) => decimalOf(decimals, power);
	if (/^[1-9]\d{0,2},\d{3}$/.test(bare)) return [plain(bare.replace(',', '')), plain(bare.replace(',', '.'))];
	if (/^[1-9]\d{0,2}\.\d{3}$/.test(bare)) return [plain(bare), plain(bare.replace('.', ''))];
	if (/^\d{1,3}(?:,\d{3})+(?:\.\d+)?$/.test(bare)) return [plain(bare.replaceAll(',', ''))];
	if (/^\d{1,3}(?:\.\d{3}){2,}(?:,\d+)?$/.test(bare))
		return [plain(bare.replaceAll('.', '').replace(',', '.'))];
	return [plain(bare.replace(',', '.'))];
}

const powers: Record<string, number> = { thousand: 3, million: 6, billion: 9 };
const scale = new RegExp(`${blank}(thousand|million|billion)(?![\\p{L}])`, 'iuy');
const rangeMark = new RegExp(
	`${blank}?(?:–|—|‒|-|\\bto\\b|\\band\\b)${blank}?[+\\u2212-]?(${number}|${spelled})(?![\\p{L}\\p{N}])`,
	'iuy'
);
const marginMark = new RegExp(`${blank}?(?:±|\\+/-|plus or minus)${blank}?(${number})`, 'iuy');
const at = (pattern: RegExp, text: string, index: number): RegExpExecArray | null => {
	pattern.lastIndex = index;
	return pattern.exec(text);
};
const valueOf = (text: string, power = 0): Decimal[] =>
	/^\d/.test(text) ? readingsOf(text, power) : [decimalOf(String(spelledValue(text)), power)];

/** Halves of things that nobody measures. */
const figurative =
	/^ (?:of )?(?:the|our|a) (?:story|battle|team|staff|fun|truth|trick|people|world|job|room|table|day|night|week|month|year|evening|way|answer|point|lab)\b/i;

/** What says that a word such as “half” is a part of something measured, and not of an hour or of a pair. */
const partOf =
	/^ ?(?:of|as|the|their|its|that|this|what|less|more|faster|slower|quicker|shorter|longer|lower|higher|cooler|quieter|louder|hotter|again|better|worse)(?![\p{L}])/iu;
const timesOf =
	/^ (?:as|the|that(?= (?:of|which|under|with))|what|its|their|faster|slower|quicker|more|less|better|longer|higher|over)(?![\p{L}])/iu;

/** Whether a ratio in a word is one of its own kind; “twice” alone says how often, “half an hour” how long. */
function isRatioWord(word: WordRatio, said: string, before: string, after: string): boolean {
	if (/-?fold$/i.test(said) || word.verb) return true;
	if (/\b(?:by|a factor of|than)$/i.test(before) && !/^ (?:a|an)\b/i.test(after)) return true;
	if (/^(?:double|triple)$/i.test(said)) return /^ (?:the|that|its|their|what)(?![\p{L}])/iu.test(after);
	if (word.kind === 'times') return timesOf.test(after) && !/^ as (?:many )?(?:soon|often)/i.test(after);
	if (/\b(?:cut|cuts|cutting|slash|slashes)\b[^.,;]*\bin$/i.test(before)) return true;
	if (figurative.test(after)) return false;
	if (/\b(?:first|second|other|top|lower|upper|each|every|another)$/i.test(before)) return false;
	return partOf.test(after);
}

function wordFigure(text: string, from: number, said: string): Figure | null {
	const word = wordRatio(said);
	const before = text.slice(Math.max(0, from - 60), from).trimEnd();
	const after = text.slice(from + said.length, from + said.length + 40);
	if (!word || !isRatioWord(word, said, before, after)) return null;
	const to = from + said.length;
	const value: Decimal = { text: String(word.value), places: 2, value: word.value };
	const none = { high: null, margin: null, sign: null, not: null } as const;
	return {
		from,
		to,
		numberTo: to,
		readings: [value],
		hedge: hedgeOf(before),
		quantity: { kind: 'times' },
		word,
		...none
	};
}

/** What behind a number alone says that it counts things. */
const counted = /^[- ](?:of the )?(?:\p{Ll}+[- ]){0,2}\p{Ll}{2,}/u;

function kindOfBare(text: string, from: number, to: number, spelledOut: boolean): NotClaim | null {
	const said = text.slice(from, to);
	if (/^(?:1[89]|20)\d\d$/.test(said)) return 'year';
	if (spelledOut) return 'count';
	if (/^\p{L}/u.test(text.slice(to))) return 'name';
	const decimal = /[.,]\d/.test(said) && !/^\d{1,3}(?:,\d{3})+$/.test(said);
	if (!decimal && counted.test(text.slice(to))) {
		const next = /^[- ](\p{Ll}+)/u.exec(text.slice(to))?.[1] ?? '';
		if (!notCounted.has(next)) return 'count';
	}
	const before = /(\p{L}+)[ \u00a0]$/u.exec(text.slice(Math.max(0, from - 24), from));
	const capital =
		before &&
		/^\p{Lu}/u.test(before[1] ?? '') &&
		!/[.!?] ?$/.test(text.slice(Math.max(0, from - before[0].length - 2), from - before[0].length));
	return capital && from - before[0].length > 0 ? 'name' : null;
}
/** Words behind a number that are not what it counts. */
const notCounted = new Set(
	'and or to in at on with over under for is was were are than against from as by but while where which of that so then if when instead on after before per'.split(
		' '
	)
);

/** A verb of change before “from 61 to 70”, which makes two values of it and no range. */
const changes =
	/\b(?:climb|rise|rose|fall|fell|drop|go|went|grow|grew|increase|decrease|improve|sink|shrink|cut|come|came|move|take|took|slow|speed|bring|brought|lower|raise|reduce)\w*\b[^.;]{0,60}$/i;

function digitFigure(text: string, start: number, said: string, units: UnitReader): Figure {
	const isSpelled = !/^\d/.test(said);
	const signed = /(?:^|[\s(\u00a0~≈])([+\u2212±-])$/.exec(text.slice(Math.max(0, start - 2), start))?.[1];
	let from = signed ? start - 1 : start;
	const paid = currencyBefore(text, from);
	let end = start + said.length;
	const scaled = at(scale, text, end);
	const power = powers[scaled?.[1]?.toLowerCase() ?? ''] ?? 0;
	if (scaled) end += scaled[0].length;
	let readings = valueOf(said, power);
	let { quantity, to } = units.read(text, end);
	let high: Decimal | null = null;
	let margin: Decimal | null = null;
	const before = text.slice(Math.max(0, from - 30), from).trimEnd();
	const ranged = at(rangeMark, text, to);
	const moves = /\bfrom$/i.test(before) && changes.test(text.slice(Math.max(0, from - 90), from));
	const joined = /\band\b/i.test(ranged?.[0] ?? '')
		? /\bbetween$/i.test(before)
		: !/\bfrom$/i.test(before) || quantity.kind === 'bare';
	if (ranged && joined) {
		const second = ranged[1] ?? '';
		const secondEnd = to + ranged[0].length;
		const next = units.read(text, secondEnd);
		const same = quantity.kind === 'bare' || JSON.stringify(quantity) === JSON.stringify(next.quantity);
		if (moves && quantity.kind === 'bare') quantity = next.quantity;
		else if (same && next.quantity.kind !== 'bare') {
			high = valueOf(second)[0] ?? null;
			quantity = next.quantity;
			to = next.to;
			end = secondEnd;
		}
	}
	const spread = at(marginMark, text, high ? to : end);
	if (spread && !high) {
		margin = readingsOf(spread[1] ?? '')[0] ?? null;
		end += spread[0].length;
		({ quantity, to } = units.read(text, end));
	}
	if (paid) {
		from = paid.from;
		quantity = { kind: 'price', currency: paid.currency };
		to = end;
	}
	if (signed === '±') {
		margin = readings[0] ?? null;
		readings = [];
	}
	const sign = signed === '+' ? 1 : signed === '\u2212' || signed === '-' ? -1 : null;
	const hedged =
		hedgeOf(text.slice(Math.max(0, from - 30), from).trimEnd()) ??
		(/^ or so\b/.test(text.slice(to)) ? 'about' : null);
	const bare = quantity.kind === 'bare' ? kindOfBare(text, start, end, isSpelled) : null;
	return {
		from,
		to,
		numberTo: end,
		readings,
		high,
		margin,
		hedge: hedged,
		sign,
		quantity,
		word: null,
		not: bare
	};
}

/** “three times” says how often, unless something measured is multiplied. */
function countsTimes(text: string, figure: Figure): boolean {
	if (figure.quantity.kind !== 'times' || figure.word) return false;
	if (!/times$/i.test(text.slice(figure.from, figure.to))) return false;
	const before = text.slice(Math.max(0, figure.from - 16), figure.from).trimEnd();
	if (/\b(?:by|factor of)$/i.test(before) || /[.,]\d/.test(text.slice(figure.from, figure.numberTo)))
		return false;
	return !timesOf.test(text.slice(figure.to, figure.to + 20));
}

/** Every number of a passage, those that are no measured claims included with the reason. */
export function figuresOf(text: string, shields: readonly Shield[], units: UnitReader): Figure[] {
	const found: Figure[] = [];
	let done = 0;
	for (const match of text.matchAll(scanner)) {
		const [said, ciphers, ratio] = match;
		if (match.index < done) continue;
		const figure =
			ratio === undefined ? digitFigure(text, match.index, said, units) : wordFigure(text, match.index, said);
		if (!figure) continue;
		const shield = shields.find((one) => one.from < figure.numberTo && one.to > match.index);
		const named = shield && !(shield.sort === 'name' && shield.to < figure.numberTo) ? shield.sort : null;
		if (named) figure.not = named;
		else if (countsTimes(text, figure)) figure.not = 'count';
		else if (ciphers === undefined && !ratio && figure.quantity.kind === 'bare') figure.not = 'count';
		else if (/^one$/i.test(said) && figure.quantity.kind === 'times') figure.not = 'count';
		done = figure.to;
		found.push(figure);
	}
	return found;
}
