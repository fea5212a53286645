import type { Passage } from './prose';

/** Why a number in prose is no measured claim. */
export type NotClaim =
	| 'year'
	| 'date'
	| 'time'
	| 'version'
	| 'name'
	| 'ordinal'
	| 'reference'
	| 'dimension'
	| 'term'
	| 'heading'
	| 'count';

/** A stretch of a passage in which numbers are of another sort. */
export interface Shield {
	from: number;
	to: number;
	sort: NotClaim;
}

const month =
	'(?:January|February|March|April|May|June|July|August|September|October|November|December|Jan\\.?|Feb\\.?|Mar\\.?|Apr\\.?|Jun\\.?|Jul\\.?|Aug\\.?|Sept?\\.?|Oct\\.?|Nov\\.?|Dec\\.?)';
/** Behind a number that stands alone: no further digits, no unit glued or apart. */
const alone =
	'(?![A-Za-z\\d]|[.,]\\d|[ \\u00a0\\u2009\\u202f]?(?:%|°|per ?cent|[mkMGTn]?(?:W|V|A|Hz|s|J)(?![A-Za-z])|MT/s|K(?![A-Za-z])|frames|fps|GB|MB|times|×|min(?![A-Za-z])))';

const patterns: [NotClaim, RegExp][] = [
	['date', /(?<!\d)\d{4}-\d{2}-\d{2}(?!\d)/gu],
	['date', new RegExp(`(?<!\\d)\\d{1,2}(?:st|nd|rd|th)?(?: of)? ${month}(?:,? \\d{4})?(?![A-Za-z\\d])`, 'g')],
	['date', new RegExp(`\\b${month} (?:\\d{4}|\\d{1,2}(?:st|nd|rd|th)?(?:, \\d{4})?)${alone}`, 'g')],
	['date', /(?<![\d.])\d{1,2}[./]\d{1,2}[./](?:\d{4}|\d{2})(?![\d.])/gu],
	['time', /(?<![\d:])\d{1,2}:\d{2}(?::\d{2})?(?![\d:])/gu],
	['time', /(?<![\d.,])\d{1,2}(?:[.:]\d{2})?[ \u00a0]?(?:a\.m\.|p\.m\.|am|pm|o[’']clock)\b/gi],
	['time', /(?<![\d.,])\d{1,2}\.\d{2} (?:CET|CEST|UTC|GMT)\b/g],
	['dimension', /(?<![\d:])\d+:\d+(?::\d+)*(?![\d:])/gu],
	[
		'dimension',
		/(?<![\p{L}\d.,])\d+(?:\.\d+)?[ \u00a0]?[×x][ \u00a0]?\d+(?:[ \u00a0]?(?:[kMGT]i?B|mm|cm))?/gu
	],
	['version', /\bv\d+(?:\.\d+)*/gi],
	[
		'version',
		new RegExp(
			`\\b(?:version|versions|firmware|driver|release|kernel|bios|revision|rev\\.?|agesa|patch|os) \\d+(?:\\.\\d+)*${alone}(?: (?:and|or|to) \\d+(?:\\.\\d+)+)?`,
			'gi'
		)
	],
	['version', /(?<![\d.,])(?!\d{1,3}(?:\.\d{3})+(?![\d.]))\d+\.\d+\.\d+(?:\.\d+)*/gu],
	['ordinal', /(?<![\p{L}\d.,])\d+(?:st|nd|rd|th)(?![\p{L}\d])/giu],
	['year', /(?<![\p{L}\d.,])(?:1[89]|20)\d\ds(?![\p{L}])/gu],
	[
		'reference',
		new RegExp(
			`\\b(?:figures?|figs?\\.|tables?|steps?|sections?|parts?|chapters?|pages?|pp?\\.|notes?|lines?|issues?|levels?|ranks?|numbers?|nos?\\.|cores?|slots?|channels?|banks?|stages?|phases?|groups?|editions?|days?|weeks?|gen(?:eration)?|class|tier|plates?|rows?|columns?|samples?|appendix|type|socket|port|pci[- ]?e?(?:xpress)?|ddr|usb|layer|lane|room|bench|attempt|run|test|sitting) #?\\d+(?:\\.\\d+)*(?:(?:,| and| to|–|-) ?\\d+)*${alone}`,
			'gi'
		)
	],
	['reference', /#\d+/gu],
	[
		'term',
		/(?:90|95|99)[ \u00a0]?(?:%|per ?cent)[- \u00a0](?:confidence|interval|intervals|level|CI|limits?|certain|sure)/giu
	],
	['term', /(?:1|5|0\.1)[ \u00a0]?(?:%|per ?cent)[- \u00a0](?:lows?|low frames?)/giu]
];

const headingNumber = /^(?:\d+(?:\.\d+)*[.)]?|\d+\))(?=[ \u00a0]\p{L})/u;

/** Dates, times, versions, references … of a passage. */
export function shieldsOf({ kind, text }: Passage): Shield[] {
	if (!/\d/.test(text)) return [];
	const found: Shield[] = patterns.flatMap(([sort, pattern]) =>
		[...text.matchAll(pattern)].map((match) => ({
			from: match.index,
			to: match.index + match[0].length,
			sort
		}))
	);
	const numbered = kind === 'heading' ? headingNumber.exec(text) : null;
	if (numbered) found.push({ from: 0, to: numbered[0].length, sort: 'heading' });
	return found;
}
