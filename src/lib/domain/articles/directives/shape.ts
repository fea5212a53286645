import type { Token } from 'marked';
import type { ArticleData } from '../data';
import { onceFor } from '../once-for';
import type { PlateSpec } from '../plates/spec';

/** What a directive could not do, in words for its writer, with the names that exist. */
export interface Problem {
	message: string;
	nearest: string[];
}

/** Either what was looked for or why not. */
export type Lookup<T> = { ok: true; value: T } | { ok: false; problem: Problem };

export const found = <T>(value: T): Lookup<T> => ({ ok: true, value });
export const missing = (message: string, nearest: string[] = []): { ok: false; problem: Problem } => ({
	ok: false,
	problem: { message, nearest }
});

/** A directive as it was written. */
export interface Call {
	name: string;
	attributes: Record<string, string>;
	/** Line of the source, from 1. */
	line: number;
}

export const cautionTopics = ['voltage', 'power', 'heat', 'liquid', 'static', 'data', 'mains'] as const;
export type CautionTopic = (typeof cautionTopics)[number];

/** A number in the prose that is bound to stored runs. */
export interface BoundFigure {
	directive: 'reading' | 'gain' | 'overall';
	line: number;
	campaign: string;
	profile: string;
	/** Null for an overall figure. */
	workload: string | null;
	/** The profile it is held against; null for a reading. */
	over: string | null;
	/** As it stands on the page. */
	printed: string;
	/** At full precision, in `unit`. */
	value: number;
	unit: string;
}

/** A cell of a campaign whose data the article shows. */
export interface UsedCell {
	campaign: string;
	profile: string;
	workload: string;
}

/** What a directive leaves behind besides its markup. */
export interface Trace {
	bound?: BoundFigure;
	plate?: PlateSpec;
	cells?: UsedCell[];
	profiles?: { campaign: string; profile: string }[];
	campaigns?: string[];
	cautions?: CautionTopic[];
	disclosure?: true;
	/** Slugs of the glossary's terms. */
	terms?: string[];
}

export interface Printed extends Trace {
	html: string;
	/** The same in plain text, for feeds, search and the word count; empty where it adds nothing. */
	plain: string;
	/** How a narrator says it, figures and units as printed; a cue in square brackets; empty for silence. As `plain` if left out. */
	spoken?: string;
}

/** What stands in a container, settled and printed already. */
export interface Inside {
	tokens: Token[];
	html: string;
	plain: string;
	spoken: string;
}

/** The names an attribute takes; null where any text will do. */
export type Values = readonly string[] | null;

export interface Attribute {
	name: string;
	required: boolean;
	/** What it is, in a few words, for the insert panel. */
	words: string;
	/** What may stand there, given what else was chosen. */
	values: (data: ArticleData, attributes: Record<string, string>) => Values;
}

/** A heading of the page. */
export interface Heading {
	level: number;
	text: string;
	id: string;
	line: number;
}

/** Draws a plate: SVG markup for its specification. */
export type Draw = (spec: PlateSpec) => string;

/** What printing needs beside what was found. */
export interface Press {
	data: ArticleData;
	draw: Draw;
	call: Call;
	/** Where the plates' files are, with a slash at its end. */
	platesAt: string;
	/** Null for what is no container. */
	inside: Inside | null;
	/** The page's own headings; complete for a directive that is printed `late`. */
	headings: readonly Heading[];
	/** Terms that stand on the page before this one. */
	termsSoFar: ReadonlySet<string>;
	/** How many step cards there are since the last heading, this one included. */
	step: number;
}

/** One directive: how it is written, how its names are resolved, how what was found is printed. */
export interface Directive<T> {
	name: string;
	/** In a sentence, on a line of its own, or around text. */
	level: 'inline' | 'block' | 'container';
	/** What it prints, in a sentence for the insert panel. */
	words: string;
	attributes: Attribute[];
	/** Blocks and containers that may stand in it; text may always. */
	holds?: readonly string[];
	/** The one container it makes sense in. */
	within?: string;
	/** What a container holds at first, for the insert panel. */
	sample?: string;
	/** Printed when the rest of the page is known. */
	late?: true;
	/** What it finds rests on its attributes and the data alone, so that it is found once. */
	lasting?: true;
	resolve: (call: Call, data: ArticleData, press: Press) => Lookup<T>;
	render: (value: T, press: Press) => Printed;
}

/** A directive with its own types closed over, so that all of them fit one list. */
export interface AnyDirective extends Omit<Directive<unknown>, 'resolve' | 'render'> {
	print: (press: Press) => Lookup<Printed>;
}

/** Closes a directive over the type it resolves to. */
export const directive = <T>({ resolve, render, ...it }: Directive<T>): AnyDirective => ({
	...it,
	print: (press) => {
		const { call, data } = press;
		const find = () => resolve(call, data, press);
		const result = it.lasting ? onceFor(data, `${it.name} ${JSON.stringify(call.attributes)}`, find) : find();
		return result.ok ? found(render(result.value, press)) : result;
	}
});
