import { diff3MergeRegions } from 'node-diff3';

/** What is put together: the texts of an article as one person has them. */
export interface MergeText {
	title: string;
	standfirst: string;
	source: string;
}

export type Place = keyof MergeText;
export const places: readonly Place[] = ['title', 'standfirst', 'source'];

/** A way out of a place that both changed: `together` where their words do not touch, `both` one after the other. */
export type Choice = 'together' | 'theirs' | 'mine' | 'both';

export interface Conflict {
	kind: 'conflict';
	place: Place;
	/** The same for the same texts, so that a choice stands while other places are typed in. */
	id: string;
	base: string;
	mine: string;
	theirs: string;
	/** What each choice makes of it, line by line; those that can be taken. */
	options: Partial<Record<Choice, string[]>>;
	/** The choice by which neither loses a word; null where a person must decide. */
	suggested: Choice | null;
}

export type MergePart = { kind: 'same' | 'mine' | 'theirs' | 'agreed'; lines: string[] } | Conflict;

export interface Merge {
	parts: Record<Place, MergePart[]>;
	conflicts: Conflict[];
	/** Places that one alone changed. */
	mineAlone: number;
	theirsAlone: number;
}

const equal = (a: readonly string[], b: readonly string[]): boolean =>
	a.length === b.length && a.every((one, index) => one === b[index]);

const pieces = (text: string): string[] => text.match(/\n|[^\S\n]+|[\p{L}\p{N}]+|[^\s\p{L}\p{N}]/gu) ?? [];

/** A longer passage is put together line by line alone: the words of it take too long to hold against each other. */
const longestByWords = 8000;

/** Both changes to one passage, where their words do not touch; null where they do. */
function byWords(base: string, mine: string, theirs: string): string | null {
	if (Math.max(base.length, mine.length, theirs.length) > longestByWords) return null;
	if (base.trim() === '' || mine.trim() === '' || theirs.trim() === '') return null;
	const out: string[] = [];
	for (const region of diff3MergeRegions(pieces(mine), pieces(base), pieces(theirs))) {
		if (region.stable) out.push(...region.bufferContent);
		else if (equal(region.aContent, region.bContent)) out.push(...region.aContent);
		else return null;
	}
	return out.join('');
}

const blank = (lines: string[]): boolean => lines.every((line) => line.trim() === '');

/** One after the other, an empty line between them in the source, where it parts blocks. */
function after(place: Place, theirs: string[], mine: string[]): string[] {
	if (place !== 'source') return [[...theirs, ...mine].join(' ')];
	const parted = theirs.at(-1)?.trim() === '' || mine[0]?.trim() === '';
	return parted ? [...theirs, ...mine] : [...theirs, '', ...mine];
}

/** Where one of them wrote and the other only moved empty lines about, what was written stands. */
function wordsOf(base: string[], mine: string[], theirs: string[]): Choice | null {
	if (!blank(base) || blank(mine) === blank(theirs)) return null;
	return blank(mine) ? 'theirs' : 'mine';
}

function conflictOf(place: Place, base: string[], mine: string[], theirs: string[]): Conflict {
	const [was, ours, others] = [base, mine, theirs].map((lines) => lines.join('\n')) as [
		string,
		string,
		string
	];
	const together = byWords(was, ours, others);
	// Both put something in where nothing was: one after the other loses nothing.
	const inserted = blank(base) && !blank(mine) && !blank(theirs) && place === 'source';
	const either = !blank(mine) && !blank(theirs) && place !== 'title';
	return {
		kind: 'conflict',
		place,
		id: JSON.stringify([place, was, ours, others]),
		base: was,
		mine: ours,
		theirs: others,
		options: {
			...(together === null ? {} : { together: together.split('\n') }),
			theirs,
			mine,
			...(either ? { both: after(place, theirs, mine) } : {})
		},
		suggested: together !== null ? 'together' : inserted ? 'both' : wordsOf(base, mine, theirs)
	};
}

function partsOf(place: Place, base: string, mine: string, theirs: string): MergePart[] {
	const lines = (text: string) => text.split('\n');
	return diff3MergeRegions(lines(mine), lines(base), lines(theirs)).map((region): MergePart => {
		if (region.stable) {
			const kind = { o: 'same', a: 'mine', b: 'theirs' } as const;
			return { kind: kind[region.buffer], lines: region.bufferContent };
		}
		const { aContent, oContent, bContent } = region;
		if (equal(aContent, bContent)) return { kind: 'agreed', lines: aContent };
		return conflictOf(place, oContent, aContent, bContent);
	});
}

/**
 * Two texts that began from a third, put together: what one of them changed stands, what both changed is a conflict
 * with the ways out of it.
 */
export function mergeTexts(base: MergeText, mine: MergeText, theirs: MergeText): Merge {
	const of = (place: Place) => partsOf(place, base[place], mine[place], theirs[place]);
	const parts = { title: of('title'), standfirst: of('standfirst'), source: of('source') };
	const all = places.flatMap((place) => parts[place]);
	return {
		parts,
		conflicts: all.filter((part): part is Conflict => part.kind === 'conflict'),
		mineAlone: all.filter((part) => part.kind === 'mine').length,
		theirsAlone: all.filter((part) => part.kind === 'theirs').length
	};
}

/** The choice that stands for a conflict: the one made, else the one by which nobody loses a word. */
export const choiceOf = (conflict: Conflict, made: Readonly<Record<string, Choice>>): Choice | null => {
	const chosen = made[conflict.id];
	return chosen !== undefined && conflict.options[chosen] ? chosen : conflict.suggested;
};

/** The text that the choices make; null while a place still waits for one. */
export function resolved({ parts }: Merge, made: Readonly<Record<string, Choice>>): MergeText | null {
	const linesOf = (part: MergePart): string[] | null => {
		if (part.kind !== 'conflict') return part.lines;
		const choice = choiceOf(part, made);
		return (choice && part.options[choice]) ?? null;
	};
	const textOf = (place: Place): string | null => {
		const lines = parts[place].map(linesOf);
		return lines.some((one) => one === null) ? null : lines.flatMap((one) => one ?? []).join('\n');
	};
	const [title, standfirst, source] = [textOf('title'), textOf('standfirst'), textOf('source')];
	return title === null || standfirst === null || source === null ? null : { title, standfirst, source };
}
