import type { Token } from 'marked';
import type { ArticleData } from '../data';
import { refusalOf } from '../limits';
import type { Binding } from './bind';
import { stateWords, type ClaimState, type Trap } from './judged';
import type { Mention } from './names';
import { passagesOf, placeOf, plainLines } from './prose';
import { passageReader } from './read-passage';

export type { Binding } from './bind';
export type { ClaimState, Trap } from './judged';
export { stateWords } from './judged';

/** A claim of an article's prose: a number, or a direction, and how it stands to the data. */
export interface Claim {
	/** Offsets into the source, its line ends being one character each; and the line, from 1. */
	from: number;
	to: number;
	line: number;
	kind: 'number' | 'direction';
	text: string;
	state: ClaimState;
	/** What the bench has, for a note; empty where nothing is near. @example 'Prime sieve, Fixed 4.95: −4.6 % (−5.0 to −4.2 %).' */
	stored: string;
	/** What more there is to say. */
	why: string;
	trap: Trap | null;
	/** Where a directive would go, and which. */
	bindFrom: number;
	bindTo: number;
	bindings: Binding[];
}

/**
 * Every claim of a source, in its order: numbers with their state, and directions held against verdicts. Nothing
 * throws for what a writer typed; a source that cannot be set has no claims.
 * @param tokens of the same source, where it was parsed already; they are only read
 */
export function claimsIn(source: string, data: ArticleData, tokens?: readonly Token[]): Claim[] {
	const plain = plainLines(source);
	if (refusalOf(plain)) return [];
	try {
		return readAll(plain, data, tokens).sort((a, b) => a.from - b.from);
	} catch (error) {
		if (error instanceof RangeError) return [];
		throw error;
	}
}

function readAll(source: string, data: ArticleData, tokens?: readonly Token[]): Claim[] {
	const claims: Claim[] = [];
	const lineOf = linesOf(source);
	const read = passageReader(data);
	let headings: Mention[] = [];
	let before: Mention[] = [];
	for (const passage of passagesOf(source, tokens)) {
		const { found, mentions } = read(passage, before);
		for (const { from, to, bindTo, ...rest } of found) {
			const place = placeOf(passage, from, to);
			const bind = placeOf(passage, from, bindTo);
			const text = source.slice(place.from, place.to);
			claims.push({
				...rest,
				...place,
				text,
				line: lineOf(place.from),
				bindFrom: bind.from,
				bindTo: bind.to
			});
		}
		if (passage.kind === 'heading') before = headings = mentions;
		else if (mentions.length > 0) before = [...headings, ...mentions];
	}
	return claims;
}

/** Tells the line of an offset, from 1. */
function linesOf(source: string): (offset: number) => number {
	const starts = [0];
	for (let at = source.indexOf('\n'); at >= 0; at = source.indexOf('\n', at + 1)) starts.push(at + 1);
	return (offset) => {
		let [low, high] = [0, starts.length];
		while (high - low > 1) {
			const middle = (low + high) >> 1;
			if ((starts[middle] ?? 0) <= offset) low = middle;
			else high = middle;
		}
		return low + 1;
	};
}

/** How many claims stand in each state. */
export function countStates(claims: readonly Claim[]): Record<ClaimState, number> {
	const counts = Object.fromEntries(Object.keys(stateWords).map((state) => [state, 0])) as Record<
		ClaimState,
		number
	>;
	for (const { state } of claims) counts[state] += 1;
	return counts;
}
