import { HOLE, type Passage } from './prose';
import type { Mention } from './names';

/** A stretch of a passage with the names in it. */
export interface Stretch {
	from: number;
	to: number;
}

const shortened = /(?:\b(?:e\.g|i\.e|vs|ca|c|approx|no|fig|figs|cf|etc|dr|st|a\.m|p\.m))\.$/i;

/** What goes on longer without a full stop is no sentence: it is taken in pieces, so that work stays even. */
const longestSentence = 800;

/** Sentences of a text, as indices. */
export function sentencesOf(text: string): Stretch[] {
	const found: Stretch[] = [];
	let from = 0;
	const upTo = (to: number) => {
		for (; to - from > longestSentence; from += longestSentence)
			found.push({ from, to: from + longestSentence });
		if (to > from) found.push({ from, to });
		from = to;
	};
	for (const match of text.matchAll(/[.!?…]+["”’')\]]*(?=\s+["“‘'(]*[\p{Lu}\p{N}\ufffc]|\s*$)/gu)) {
		const to = match.index + match[0].length;
		if (!shortened.test(text.slice(Math.max(0, to - 8), to))) upTo(to);
	}
	upTo(text.length);
	return found;
}

const breaks =
	/[;:()]|,(?!\d)|\s[–—]\s|\s(?=(?:and|but|while|whereas|where|which|instead of|rather than|against|versus|compared (?:with|to)|down from|up from|from)\s)|(?<=\bfrom\s[^,;]{1,24}?)\s(?=to\s)/gu;

/** Clauses of a sentence: what stands between its joints. A comma inside a name is none. */
export function clausesOf(text: string, { from, to }: Stretch, names: readonly Stretch[]): Stretch[] {
	const sentence = text.slice(from, to);
	const joints = [...sentence.matchAll(breaks)]
		.map((match) => from + match.index)
		.filter((joint) => !names.some((name) => name.from < joint && name.to > joint));
	const edges = [from, ...joints, to];
	return edges.slice(1).map((edge, index) => ({ from: edges[index] ?? from, to: edge }));
}

/** How surely a name belongs to a claim: in its clause, in its sentence, carried from the passage or its heading. */
export type Hold = 'clause' | 'sentence' | 'context' | 'heading' | 'none';

export interface Link {
	slugs: string[];
	hold: Hold;
}

const over =
	/(?:\bthan|\bover|\bagainst|\babove|\bbelow|\bversus|\bvs\.?|\bcompared (?:with|to)|\brelative to|\bbehind|\bahead of|\bbeyond|\bas \p{L}+ as|\b(?:times|twice|half|double|triple|thirds?|quarters?)(?: of)? the \p{L}+ of|\bthat of)(?: (?:the|at|with|what|under|that|our|of|it|its|on|does|they come|it comes|comes|under))*\s*$/iu;

/** Whether a name stands for what something is held against, as in “than stock”. */
export const isOver = (text: string, mention: Stretch): boolean =>
	over.test(text.slice(Math.max(0, mention.from - 40), mention.from));

const slugsOf = ({ named }: Mention): string[] => ('slugs' in named ? named.slugs : []);
const inside = (mention: Stretch, stretch: Stretch) =>
	mention.from >= stretch.from && mention.from < stretch.to;

/** A name right behind a number, tied to it by a preposition, as in “9 % in the render”. */
const tied =
	/^[^,;:.()]{0,40}?\b(?:in|for|on|under|with|at|during|of|through|from|by)(?: (?:the|our|a|this|that))?\s*$/i;

/** The one of several names in a clause that a number belongs to. */
function nearest(text: string, at: Stretch, mentions: Mention[], nextNumber: number): Mention | undefined {
	const after = mentions.find((one) => one.from >= at.to);
	const before = mentions.filter((one) => one.to <= at.from).at(-1);
	if (after && after.from < nextNumber && tied.test(text.slice(at.to, after.from))) return after;
	const under = mentions.find((one) => one.from <= at.from && one.to >= at.from);
	return before ?? under ?? after;
}

/** Everything known about where a claim stands. */
export interface Surroundings {
	passage: Passage;
	at: Stretch;
	clause: Stretch;
	sentence: Stretch;
	/** Names of the whole passage, in order. */
	mentions: Mention[];
	/** Where the next number of the passage begins. */
	nextNumber: number;
	/** Names that came before the passage: of its heading and the last paragraph under it, the nearest last. */
	before: Mention[];
}

/** Whether a directive stands right beside a claim, as in “:gain{…} faster”. */
const beside = (mention: Stretch, at: Stretch): boolean =>
	Math.abs(at.from - mention.to) < 3 || Math.abs(mention.from - at.to) < 3;

/** The workload or profile a claim is about, and how surely. */
export function linkOf(kind: 'workload' | 'profile', s: Surroundings): Link {
	const { passage, at, clause, sentence } = s;
	const { text } = passage;
	const all = s.mentions.filter(
		(one) => one.named.kind === kind && (kind === 'workload' || !isOver(text, one))
	);
	const ofKind = all.filter((one) => !one.ofDirective || beside(one, at));
	const here = ofKind.filter((one) => inside(one, clause));
	const chosen = nearest(text, at, here, s.nextNumber);
	if (chosen) return { slugs: slugsOf(chosen), hold: 'clause' };
	const near = ofKind.filter((one) => inside(one, sentence));
	const mine = near.filter((one) => one.to <= at.from).at(-1) ?? near[0];
	if (mine) return { slugs: slugsOf(mine), hold: 'sentence' };
	const last = all.filter((one) => one.to <= at.from).at(-1);
	if (last) return { slugs: slugsOf(last), hold: 'context' };
	const earlier = s.before.filter((one) => one.named.kind === kind).at(-1);
	return earlier ? { slugs: slugsOf(earlier), hold: 'heading' } : { slugs: [], hold: 'none' };
}

/** The profile a claim is held against, where its sentence names one. */
export function overOf({ passage, clause, sentence, mentions }: Surroundings): string[] {
	const named = mentions.filter((one) => one.named.kind === 'profile' && isOver(passage.text, one));
	const here = named.filter((one) => inside(one, clause));
	const [first] = here.length > 0 ? here : named.filter((one) => inside(one, sentence));
	return first ? slugsOf(first) : [];
}

/** Names of one kind in the claim's sentence, however they are meant. */
export const namedIn = ({ mentions, sentence }: Surroundings, kind: 'workload' | 'profile'): string[] => [
	...new Set(mentions.filter((one) => one.named.kind === kind && inside(one, sentence)).flatMap(slugsOf))
];

/** Settings and derived facts that the claim's clause names, else its sentence. */
export function settingsIn({ mentions, clause, sentence }: Surroundings): { names: string[]; hold: Hold } {
	const of = (stretch: Stretch) =>
		mentions.flatMap((one) => (one.named.kind === 'setting' && inside(one, stretch) ? one.named.names : []));
	const here = of(clause);
	if (here.length > 0) return { names: here, hold: 'clause' };
	const near = of(sentence);
	return { names: near, hold: near.length > 0 ? 'sentence' : 'none' };
}

/** A text with its holes as blanks, for looking at words around a claim. */
export const words = (text: string): string => text.replaceAll(HOLE, ' ');
