import type { BoundFigure, CautionTopic, Heading, UsedCell } from './directives/shape';
import type { PlateSpec } from './plates/spec';

/** What cannot be printed, where, and what would be near. */
export interface DirectiveError {
	/** Line of the source, from 1. */
	line: number;
	/** Name of the directive; 'link', 'image', 'footnote' or 'source' for what is none. */
	directive: string;
	message: string;
	nearest: string[];
}

/** An article as set: its page, not yet sanitised, and all that stands on it. */
export interface Rendered {
	html: string;
	/** The same page block by block, each with the line of the source it begins on; null for what has none. */
	blocks: { line: number | null; html: string }[];
	/** Each plate once, with its key. */
	plates: { key: string; spec: PlateSpec }[];
	/** In the order of their lines. */
	errors: DirectiveError[];
	bound: BoundFigure[];
	uses: {
		campaigns: string[];
		profiles: { campaign: string; profile: string }[];
		cells: UsedCell[];
		/** Slugs of the glossary's terms, in the order they first stand on the page. */
		terms: string[];
	};
	/** Topics of the cautions the page gives, beside a step or on their own. */
	cautions: CautionTopic[];
	hasDisclosure: boolean;
	headings: Heading[];
	wordCount: number;
	plain: string;
}

/** A page with nothing on it. */
export const emptyPage = (): Rendered => ({
	html: '',
	blocks: [],
	plates: [],
	errors: [],
	bound: [],
	uses: { campaigns: [], profiles: [], cells: [], terms: [] },
	cautions: [],
	hasDisclosure: false,
	headings: [],
	wordCount: 0,
	plain: ''
});
