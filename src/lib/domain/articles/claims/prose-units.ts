import { unitsOf } from '../../shared/units';

/** What a number in prose is a number of. */
export type Quantity =
	| { kind: 'percent' }
	| { kind: 'points' }
	| { kind: 'times' }
	| { kind: 'unit'; unit: string }
	| { kind: 'price'; currency: string }
	| { kind: 'bare' };

/** Units that benches write beside those that have a kind of their own (common practice, no source). */
const more =
	'MT/s GT/s K/W °C/W dB sone sones rpm RPM events/s km m cm mm kg g MB GB TB kB KB KiB MiB GiB TiB Gbit/s Mbit/s mΩ Ω ° ml l us µs'.split(
		' '
	);

/** Units by their names, in the plural as well. */
const words: Record<string, string> = {
	second: 's',
	millisecond: 'ms',
	microsecond: 'μs',
	nanosecond: 'ns',
	minute: 'min',
	hour: 'h',
	watt: 'W',
	milliwatt: 'mW',
	kilowatt: 'kW',
	'watt-hour': 'Wh',
	'watt hour': 'Wh',
	'kilowatt-hour': 'kWh',
	'kilowatt hour': 'kWh',
	joule: 'J',
	volt: 'V',
	millivolt: 'mV',
	amp: 'A',
	ampere: 'A',
	hertz: 'Hz',
	megahertz: 'MHz',
	gigahertz: 'GHz',
	'degree celsius': '°C',
	'degrees celsius': '°C',
	degree: '°C',
	kelvin: 'K',
	decibel: 'dB(A)',
	sone: 'sone',
	metre: 'm',
	millimetre: 'mm',
	centimetre: 'cm',
	gigabyte: 'GB',
	megabyte: 'MB',
	'frame per second': 'frames/s',
	'frames per second': 'frames/s',
	'frames a second': 'frames/s',
	'events per second': 'events/s',
	'events a second': 'events/s',
	'gigabytes per second': 'GB/s',
	'gigabytes a second': 'GB/s',
	'megabytes per second': 'MB/s',
	'megabytes a second': 'MB/s',
	'megatransfers per second': 'MT/s',
	'transfers per second': 'T/s'
};

const currencySigns: Record<string, string> = { $: 'USD', '€': 'EUR', '£': 'GBP' };
const currencyWords: Record<string, string> = {
	euro: 'EUR',
	euros: 'EUR',
	dollar: 'USD',
	dollars: 'USD',
	pound: 'GBP',
	pounds: 'GBP',
	krone: 'NOK',
	kroner: 'NOK'
};

export const blank = '[ \\u00a0\\u2007\\u2009\\u202f]';
const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');
const longestFirst = (texts: Iterable<string>): string =>
	[...new Set(texts)]
		.sort((a, b) => b.length - a.length)
		.map(escaped)
		.join('|');

/** What may stand behind a number, and how it is read; made once for the units an article's data has. */
export interface UnitReader {
	/** The quantity named from an index on, and where its name ends; bare where none is named. */
	read: (text: string, at: number) => { quantity: Quantity; to: number };
}

/** A reader for the usual units and those of the data. */
export function unitReader(ofData: Iterable<string>): UnitReader {
	const symbols = longestFirst([...unitsOf(), ...more, ...ofData].filter((unit) => !/^[×%]?$/.test(unit)));
	const names = longestFirst(Object.keys(words).flatMap((word) => [`${word}s`, word]));
	const gap = `(?:${blank}|-)?`;
	const percent = new RegExp(
		`${gap}(?:(percentage${blank}points?|p\\.?p\\.?(?![\\p{L}])|%${blank}?-?points?)|(%|per${blank}?cent(?![\\p{L}])))`,
		'iuy'
	);
	const times = new RegExp(`${blank}?(?:×|x(?![\\p{L}\\p{N}])|times(?![\\p{L}]))|-?fold(?![\\p{L}])`, 'iuy');
	const symbol = new RegExp(`${gap}(${symbols})(?![\\p{L}\\p{N}/])`, 'uy');
	const name = new RegExp(`${gap}(${names})(?![\\p{L}])`, 'iuy');
	const money = new RegExp(
		`${blank}?(?:([$€£])|([A-Z]{3})(?![\\p{L}])|(${Object.keys(currencyWords).join('|')})(?![\\p{L}]))`,
		'uy'
	);
	const at = (pattern: RegExp, text: string, index: number): RegExpExecArray | null => {
		pattern.lastIndex = index;
		return pattern.exec(text);
	};
	return {
		read(text, index) {
			const share = at(percent, text, index);
			if (share) {
				const kind = share[1] ? ('points' as const) : ('percent' as const);
				return { quantity: { kind }, to: index + share[0].length };
			}
			const unit = at(symbol, text, index);
			if (unit) {
				// “4K” is a picture’s size; kelvin stand apart from their number or behind a decimal.
				const glued = unit[0] === 'K' && !/[.,]\d+$/.test(text.slice(Math.max(0, index - 8), index));
				if (!glued) return { quantity: { kind: 'unit', unit: unit[1] ?? '' }, to: index + unit[0].length };
			}
			const fold = at(times, text, index);
			if (fold) return { quantity: { kind: 'times' }, to: index + fold[0].length };
			const word = at(name, text, index);
			if (word) {
				const plain = (word[1] ?? '').toLowerCase();
				const known = words[plain] ?? words[plain.replace(/s$/, '')] ?? plain;
				return { quantity: { kind: 'unit', unit: known }, to: index + word[0].length };
			}
			const paid = at(money, text, index);
			const currency =
				currencySigns[paid?.[1] ?? ''] ?? currencyWords[paid?.[3] ?? ''] ?? isoOf(paid?.[2] ?? '');
			if (paid && currency) return { quantity: { kind: 'price', currency }, to: index + paid[0].length };
			return { quantity: { kind: 'bare' }, to: index };
		}
	};
}

const isoOf = (code: string): string | undefined =>
	['USD', 'EUR', 'GBP', 'NOK', 'SEK', 'DKK', 'CHF', 'JPY', 'CAD', 'AUD', 'PLN', 'CZK'].includes(code)
		? code
		: undefined;

/** A currency sign right before an index, and where it begins. */
export function currencyBefore(text: string, at: number): { currency: string; from: number } | null {
	const match = /(?:([$€£])|\b(USD|EUR|GBP|NOK|SEK|CHF))[ \u00a0]?$/.exec(
		text.slice(Math.max(0, at - 5), at)
	);
	const currency = currencySigns[match?.[1] ?? ''] ?? match?.[2];
	return match && currency ? { currency, from: at - match[0].length } : null;
}
