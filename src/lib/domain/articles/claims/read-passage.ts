import type { ArticleData } from '../data';
import { benchFacts, type BenchFacts } from './bench-facts';
import { bindingsOf, type Binding } from './bind';
import type { Datum } from './datum';
import { judgeDirection } from './direction';
import { sayingsIn } from './direction-words';
import { figuresOf, type Figure } from './figures';
import { judgePercent, judgePoints } from './judge-percent';
import { judgeTimes } from './judge-times';
import { judgeBare, judgePrice, judgeUnit } from './judge-unit';
import { caseOf, judged, type Judged } from './judged';
import { mentionsIn, type Mention } from './names';
import { shieldsOf, type Shield } from './not-claims';
import type { Passage } from './prose';
import { clausesOf, sentencesOf, type Stretch, type Surroundings } from './scope';
import { textTrap } from './text-traps';

/** A claim by where it stands in its passage. */
export interface Found extends Stretch {
	kind: 'number' | 'direction';
	/** Where a directive would end. */
	bindTo: number;
	state: Judged['state'];
	stored: string;
	why: string;
	trap: Judged['trap'];
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

function judge(figure: Figure, s: Surroundings, facts: BenchFacts): Judged | null {
	const of = caseOf(figure, s, facts);
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

/** The names a directive stands for. */
function asMentions({ at, attributes }: Passage['directives'][number]): Mention[] {
	const place = { from: at, to: at + 1, whole: false, ofDirective: true as const };
	const { workload, profile } = attributes;
	return [
		...(workload ? [{ ...place, named: { kind: 'workload' as const, slugs: [workload] } }] : []),
		...(profile ? [{ ...place, named: { kind: 'profile' as const, slugs: [profile] } }] : [])
	];
}

/** How far back in a passage a name is still spoken of, in characters. */
const farthest = 1500;

/** Where things stand in a passage: its sentences, their clauses, and its names. */
function surroundings(passage: Passage, mentions: Mention[], before: Mention[]) {
	const { text } = passage;
	const sentences = sentencesOf(text).map((sentence) => ({
		sentence,
		clauses: clausesOf(text, sentence, mentions)
	}));
	return (at: Stretch, nextNumber: number): Surroundings => {
		const holds = (one: Stretch) => one.from <= at.from && one.to > at.from;
		const found = sentences.find((one) => holds(one.sentence));
		const sentence = found?.sentence ?? { from: 0, to: text.length };
		const clause = found?.clauses.find(holds) ?? sentence;
		const near = mentions.filter((one) => one.to > sentence.from - farthest && one.from < sentence.to);
		return { passage, at, clause, sentence, mentions: near, nextNumber, before };
	};
}

/** Whether a saying belongs to a number beside it, which was judged with it. */
const besideNumber = (text: string, { from, to }: Stretch, figures: readonly Figure[]): boolean =>
	figures.some(
		(figure) =>
			figure.from < to + 24 &&
			figure.to > from - 24 &&
			!/[,;.]/.test(text.slice(Math.min(figure.to, to), Math.max(figure.from, from)))
	);

/** Every claim of one passage, and the names in it, which the next one may speak of. */
function findIn(
	passage: Passage,
	before: Mention[],
	facts: BenchFacts
): { found: Found[]; mentions: Mention[] } {
	const { text } = passage;
	const found: Found[] = [];
	const keep = (
		at: Stretch,
		kind: Found['kind'],
		{ state, datum, why, trap }: Judged,
		figure: Figure | null
	) => {
		const bindTo = figure?.quantity.kind === 'times' && !figure.word ? figure.numberTo : at.to;
		const bindings =
			datum && state !== 'bound' ? bindingsOf(datum, text.slice(at.from, bindTo), figure, facts.data) : [];
		found.push({
			from: at.from,
			to: at.to,
			bindTo,
			kind,
			state,
			stored: storedWords(datum),
			why,
			trap,
			bindings
		});
	};
	const written = mentionsIn(text, facts.lexicon);
	const shields: Shield[] = written.flatMap(({ from, to, whole }) =>
		whole ? [{ from, to, sort: 'name' as const }] : []
	);
	const figures = figuresOf(text, [...shieldsOf(passage), ...shields], facts.units);
	const measured = figures.filter((figure) => figure.not === null);
	const mentions = [...written, ...passage.directives.flatMap(asMentions)].sort((a, b) => a.from - b.from);
	const around = surroundings(passage, mentions, before);
	measured.forEach((figure, index) => {
		const s = around(figure, measured[index + 1]?.from ?? text.length);
		const result = textTrap(figure, measured, s) ?? judge(figure, s, facts);
		if (result) keep(figure, 'number', ofOthers(result, s), figure);
	});
	for (const { at, name } of passage.directives)
		if (bound.has(name)) keep({ from: at, to: at + 1 }, 'number', judged('bound'), null);
	for (const saying of sayingsIn(text)) {
		if (besideNumber(text, saying, measured)) continue;
		const beside = passage.directives.find(
			({ at }) => Math.abs(at + 1 - saying.from) < 3 || Math.abs(at - saying.to) < 3
		);
		// What is from elsewhere is not ours to judge.
		if (beside?.name === 'source') continue;
		const result = judgeDirection(saying, around(saying, text.length), facts);
		// Beside a directive it says what the directive says, unless it is the other way.
		if (result && !(beside && result.state === 'agrees')) keep(saying, 'direction', result, null);
	}
	return { found, mentions };
}

type Memory = Map<string, ReturnType<typeof findIn>>;
const memories = new WeakMap<ArticleData, Memory>();

/** A reader of passages that remembers those of the last text, so that a key typed costs one passage. */
export function passageReader(
	data: ArticleData
): (passage: Passage, before: Mention[]) => ReturnType<typeof findIn> {
	const facts = benchFacts(data);
	const last: Memory = memories.get(data) ?? new Map<string, ReturnType<typeof findIn>>();
	const next: Memory = new Map();
	memories.set(data, next);
	return (passage, before) => {
		const { kind, text, directives } = passage;
		const key = JSON.stringify([kind, text, directives, before.map((one) => one.named)]);
		const result = next.get(key) ?? last.get(key) ?? findIn(passage, before, facts);
		next.set(key, result);
		return result;
	};
}
