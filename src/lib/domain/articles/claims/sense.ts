import type { Stretch } from './scope';

/** Which way a change is said to go, and of what. */
export interface Sense {
	/** Of speed or score, where more is better; of the quantity itself, such as the time; or left open. */
	of: 'rate' | 'quantity' | null;
	sign: 1 | -1 | null;
}

type Row = [RegExp, Sense['of'], Sense['sign']];

/** Behind the number, as in “9 % faster”. */
const behind: Row[] = [
	[
		/^(?:faster|quicker|better|more efficient|speedier|ahead|improvement|advantage|speed-?up|stronger)/i,
		'rate',
		1
	],
	[/^(?:slower|worse|behind|less efficient|weaker)/i, 'rate', -1],
	[/^(?:more|extra) (?:frames|events|points|throughput|bandwidth|speed|performance)/i, 'rate', 1],
	[/^(?:less|fewer) (?:frames|events|points|throughput|bandwidth|speed|performance)/i, 'rate', -1],
	[
		/^(?:shorter|less|lower|fewer|cooler|quieter|cheaper|smaller|saved|saving|reduction|cut|decrease|of the (?:time|power|energy) (?:gone|saved))/i,
		'quantity',
		-1
	],
	[/^(?:longer|more|extra|hotter|warmer|louder|dearer|larger|increase)/i, 'quantity', 1],
	[/^(?:higher|above|over|up|rise|gain)/i, null, 1],
	[/^(?:below|down|drop|fall|loss|off)\b/i, null, -1]
];
/** Before it, as in “gains 9 %”; the last one counts. */
const ahead: Row[] = [
	[
		/\b(?:gain(?:s|ed|ing)?|win(?:s|ning)?|won|improv(?:e|es|ed|ing|ement)|speeds?(?: it)? up|sped up|adds?|added|ahead by|faster by|quicker by|better by|leads? by|beats?|speed-?up|brings?|advantage)\b/gi,
		'rate',
		1
	],
	[
		/\b(?:los(?:e|es|t|ing)|loss|slow(?:s|ed|ing)?(?: it)?(?: down)?|slower by|worse by|behind by|gives? up|trails?|costs?|penalty)\b/gi,
		'rate',
		-1
	],
	[
		/\b(?:sav(?:e|es|ed|ing|ings)|cuts?|shorten(?:s|ed)?|reduc(?:e|es|ed|ing|tion)|shorter by|less by|lower(?:s|ed)?|cooler by|quieter by)\b/gi,
		'quantity',
		-1
	],
	[/\b(?:lengthen(?:s|ed)?|longer by|hotter by|louder by|raises?|raised)\b/gi, 'quantity', 1],
	[
		/\b(?:ris(?:e|es|ing)|rose|climb(?:s|ed)?|grow(?:s|n)?|grew|increas(?:e|es|ed|ing)|up by|higher by|goes up)\b/gi,
		null,
		1
	],
	[
		/\b(?:fall(?:s|ing)?|fell|drop(?:s|ped|ping)?|decreas(?:e|es|ed|ing)|down by|lower by|goes down|sinks?|comes down)\b/gi,
		null,
		-1
	]
];

const quantityNouns =
	/\b(?:time|times|duration|seconds|minutes|power|draw|draws|watts|energy|joules|temperatures?|heat|noise|loudness|latency|consumption)\b/i;

/** What the words around a percentage say of it: which way it goes, and whether speed or the quantity itself is meant. */
export function senseOf(text: string, at: Stretch, clause: Stretch): Sense {
	const after = text
		.slice(at.to, Math.max(clause.to, at.to + 1))
		.replace(/^[\s\u00a0-]+(?:points? |of a |in |or so )?/, '');
	const before = text.slice(clause.from, at.from);
	const noun = quantityNouns.test(text.slice(clause.from, clause.to));
	const settled = (of: Sense['of'], sign: Sense['sign']): Sense => ({
		of: of ?? (noun ? 'quantity' : null),
		sign
	});
	const close = behind.find(([pattern]) => pattern.test(after));
	if (close?.[1]) return settled(close[1], close[2]);
	let last: { at: number; row: Row } | null = null;
	for (const row of ahead)
		for (const match of before.matchAll(row[0]))
			if (!last || match.index > last.at) last = { at: match.index, row };
	if (last) {
		const negated = /\b(?:not|never|no|n[’']t)\s*$/i.test(before.slice(0, last.at));
		return negated ? { of: null, sign: null } : settled(last.row[1], last.row[2]);
	}
	if (close) return settled(null, close[2]);
	return { of: noun ? 'quantity' : null, sign: null };
}
