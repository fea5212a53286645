import type { Token } from 'marked';
import type { ArticleData } from '../data';
import { refusalOf } from '../limits';
import { benchFacts, type BenchFacts, type Datum } from './bench-facts';
import { bindingsOf, type Binding } from './bind';
import { judgeDirection, sayingsIn } from './direction';
import { figuresOf, type Figure } from './figures';
import { judgePercent, judgePoints } from './judge-percent';
import { judgeTimes } from './judge-times';
import { judgeBare, judgePrice, judgeUnit } from './judge-unit';
import { caseOf, judged, stateWords, type ClaimState, type Judged, type Trap } from './judged';
import { mentionsIn, type Mention } from './names';
import { shieldsOf, type Shield } from './not-claims';
import { passagesOf, placeOf, plainLines, type Passage } from './prose';
import { clausesOf, sentencesOf, type Stretch, type Surroundings } from './scope';
import { textTrap } from './text-traps';

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

/** A directive of the prose that prints a stored value, counted with the claims. */
const bound = new Set(['reading', 'gain', 'overall']);

/** Words that give a number to somebody else, or to another place: it need not be ours. */
const elsewhere =
	/\b(?:(?:an)?other (?:lab|site|machine|bench|kit|card|board|processor)|other labs|elsewhere|(?:its|the|their) makers?|makers? (?:say|promise|claim)|promis(?:es|ed)|advertis(?:es|ed)|claim(?:s|ed)|on the box|data ?sheet|sheet says|according to|said to|they say|rated at|years? ago|used to)\b/i;

/** A number of somebody else's that differs from ours contradicts nothing. */
function ofOthers(found: Judged, { passage, sentence }: Surroundings): Judged {
	const foreign =
		found.state === 'contradicts' && elsewhere.test(passage.text.slice(sentence.from, sentence.to));
	return foreign ? { ...found, state: 'not-backed', trap: null } : found;
}

/** What a datum says, for a note. */
const storedWords = (datum: Datum | null): string =>
	datum ? `${datum.name}: ${datum.printed}${datum.range ? ` (${datum.range})` : ''}.` : '';

class Finder {
	readonly claims: Claim[] = [];
	private readonly lineStarts: number[] = [0];
	private before: Mention[] = [];
	private headings: Mention[] = [];

	constructor(
		private readonly source: string,
		private readonly facts: BenchFacts
	) {
		for (let at = source.indexOf('\n'); at >= 0; at = source.indexOf('\n', at + 1))
			this.lineStarts.push(at + 1);
	}

	private lineOf(offset: number): number {
		let [low, high] = [0, this.lineStarts.length];
		while (high - low > 1) {
			const middle = (low + high) >> 1;
			if ((this.lineStarts[middle] ?? 0) <= offset) low = middle;
			else high = middle;
		}
		return low + 1;
	}

	private keep(
		passage: Passage,
		at: Stretch,
		kind: Claim['kind'],
		found: Judged,
		figure: Figure | null
	): void {
		const { from, to } = placeOf(passage, at.from, at.to);
		const bind = placeOf(
			passage,
			at.from,
			figure?.quantity.kind === 'times' && !figure.word ? figure.numberTo : at.to
		);
		const text = this.source.slice(from, to);
		const { state, datum, why, trap } = found;
		this.claims.push({
			from,
			to,
			line: this.lineOf(from),
			kind,
			text,
			state,
			stored: storedWords(datum),
			why,
			trap,
			bindFrom: bind.from,
			bindTo: bind.to,
			bindings:
				datum && state !== 'bound'
					? bindingsOf(datum, this.source.slice(bind.from, bind.to), figure, this.facts.data)
					: []
		});
	}

	private judge(figure: Figure, s: Surroundings): Judged | null {
		const of = caseOf(figure, s, this.facts);
		const { quantity } = figure;
		switch (quantity.kind) {
			case 'percent':
				return judgePercent(of);
			case 'points':
				return judgePoints(of);
			case 'times':
				return judgeTimes(of);
			case 'unit':
				return judgeUnit(of, quantity.unit);
			case 'price':
				return judgePrice(of, quantity.currency);
			case 'bare':
				return judgeBare(of);
		}
	}

	read(passage: Passage): void {
		const { text } = passage;
		const written = mentionsIn(text, this.facts.lexicon);
		const shields: Shield[] = written.flatMap(({ from, to, whole }) =>
			whole ? [{ from, to, sort: 'name' as const }] : []
		);
		const figures = figuresOf(text, [...shieldsOf(passage), ...shields], this.facts.units);
		const mentions = [...written, ...passage.directives.flatMap(asMentions)].sort((a, b) => a.from - b.from);
		const measured = figures.filter((figure) => figure.not === null);
		const sentences = sentencesOf(text);
		const around = (at: Stretch, next: number): Surroundings => {
			const sentence = sentences.find((one) => one.from <= at.from && one.to > at.from) ?? {
				from: 0,
				to: text.length
			};
			const clause =
				clausesOf(text, sentence).find((one) => one.from <= at.from && one.to > at.from) ?? sentence;
			return { passage, at, clause, sentence, mentions, nextNumber: next, before: this.before };
		};
		measured.forEach((figure, index) => {
			const s = around(figure, measured[index + 1]?.from ?? text.length);
			const found = textTrap(figure, measured, s) ?? this.judge(figure, s);
			if (found) this.keep(passage, figure, 'number', ofOthers(found, s), figure);
		});
		for (const directive of passage.directives)
			if (bound.has(directive.name))
				this.keep(passage, { from: directive.at, to: directive.at + 1 }, 'number', judged('bound'), null);
		for (const found of sayingsIn(text)) {
			const near = measured.some(
				(figure) =>
					figure.from < found.to + 24 &&
					figure.to > found.from - 24 &&
					!/[,;.]/.test(text.slice(Math.min(figure.to, found.to), Math.max(figure.from, found.from)))
			);
			if (near) continue;
			const result = judgeDirection(found, around(found, text.length), this.facts);
			if (result) this.keep(passage, found, 'direction', result, null);
		}
		if (passage.kind === 'heading') this.before = this.headings = mentions;
		else if (mentions.length > 0) this.before = [...this.headings, ...mentions];
	}
}

/** The names a directive stands for. */
function asMentions({ at, attributes }: Passage['directives'][number]): Mention[] {
	const place = { from: at, to: at + 1, whole: false };
	const { workload, profile } = attributes;
	return [
		...(workload ? [{ ...place, named: { kind: 'workload' as const, slugs: [workload] } }] : []),
		...(profile ? [{ ...place, named: { kind: 'profile' as const, slugs: [profile] } }] : [])
	];
}

/**
 * Every claim of a source, in its order: numbers with their state, and directions held against verdicts. Nothing
 * throws for what a writer typed; a source that cannot be set has no claims.
 * @param tokens of the same source, where it was parsed already; they are only read
 */
export function claimsIn(source: string, data: ArticleData, tokens?: readonly Token[]): Claim[] {
	const plain = plainLines(source);
	if (refusalOf(plain)) return [];
	const finder = new Finder(plain, benchFacts(data));
	try {
		for (const passage of passagesOf(plain, tokens)) finder.read(passage);
	} catch (error) {
		if (error instanceof RangeError) return [];
		throw error;
	}
	return finder.claims.sort((a, b) => a.from - b.from);
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
