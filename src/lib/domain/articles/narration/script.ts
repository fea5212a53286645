import type { Token, Tokens } from 'marked';
import type { ArticleData } from '../data';
import { isDirective, type DirectiveToken } from '../directive-syntax';
import type { Placed } from '../markdown';
import { countWords, plainText } from '../plain-text';
import { setArticle } from '../render-article';
import { say } from './say';

/** What a line of a script is: words to say, a step to say on its own, a cue for the picture, words beside the main text. */
export type LineKind = 'say' | 'step' | 'aside' | 'cue';

export interface ScriptLine {
	kind: LineKind;
	/** As it is said; a cue in square brackets is done, not said. */
	text: string;
	/** Key of the plate a cue shows; null for other cues and all that is said. */
	plate: string | null;
	/** Line of the source, from 1. */
	line: number;
	/** Words to say; 0 for a cue. */
	words: number;
}

export interface ScriptSection {
	title: string;
	line: number;
	lines: ScriptLine[];
}

/** An article as a script for speaking, section by section, the opening first. */
export interface Script {
	title: string;
	sections: ScriptSection[];
	/** Directives that found nothing, and are left out: what the editor names as errors. */
	gaps: { line: number; message: string }[];
}

export interface Spoken {
	title: string;
	standfirst: string;
	source: string;
}

/** Names with digits in them, which a narrator reads as they are called. */
const namesOf = ({ campaigns }: ArticleData): string[] => [
	...new Set(
		campaigns.flatMap(({ name, rig, kit, profiles, workloads }) => [
			name,
			rig.name,
			...kit.map((line) => line.partName),
			...profiles.map((profile) => profile.name),
			...workloads.map((workload) => workload.name)
		])
	)
];

/** What a settled directive or footnote left to be said. */
const spokenOf = (token: Token): string => {
	const { spoken, plain } = token as { spoken?: unknown; plain?: unknown };
	return typeof spoken === 'string' ? spoken : typeof plain === 'string' ? plain : '';
};

/** Reads one article's settled token tree into lines. */
class Reader {
	readonly sections: ScriptSection[] = [];
	private readonly names: string[];

	constructor(data: ArticleData) {
		this.names = namesOf(data);
	}

	open(title: string, line: number): void {
		this.sections.push({ title, line, lines: [] });
	}

	add(kind: LineKind, text: string, line: number, plate: string | null = null): void {
		const words = kind === 'cue' ? text.trim() : say(text, this.names);
		if (words === '') return;
		this.sections
			.at(-1)
			?.lines.push({ kind, text: words, plate, line, words: kind === 'cue' ? 0 : countWords(words) });
	}

	/** Each line a cue, a step or words, as it is written. */
	private lines(text: string, line: number, kind: LineKind, plate: string | null): void {
		for (const one of text.split('\n')) {
			const cue = /^\[.*\]$/.test(one);
			const step = /^Step \d+: /.test(one);
			this.add(cue ? 'cue' : step ? 'step' : kind, one, line, cue ? plate : null);
		}
	}

	private directive(token: DirectiveToken, line: number, kind: LineKind): void {
		const plate = token.plate?.key ?? null;
		if (plate !== null && token.name === 'plate')
			this.add('cue', `[Plate: ${token.plate?.title ?? ''}]`, line, plate);
		else this.lines(spokenOf(token), line, token.level === 'container' ? 'aside' : kind, plate);
	}

	private list(token: Tokens.List, kind: LineKind): void {
		for (const [at, item] of token.items.entries()) {
			const line = (item as Placed).line ?? 1;
			const [first, ...rest] = item.tokens;
			const words = first ? plainText([first], 'spoken') : '';
			if (token.ordered) this.add('step', `Step ${Number(token.start || 1) + at}: ${words}`, line);
			else this.add(kind, words, line);
			this.blocks(rest, kind);
		}
	}

	blocks(tokens: Token[], kind: LineKind = 'say'): void {
		for (const token of tokens) {
			const line = (token as Placed).line ?? 1;
			if (isDirective(token)) this.directive(token, line, kind);
			else if (token.type === 'heading') {
				if (kind === 'say') this.open(plainText([token], 'spoken'), line);
				else this.add(kind, `${plainText([token], 'spoken')}.`, line);
			} else if (token.type === 'list') this.list(token as Tokens.List, kind);
			else if (token.type === 'blockquote') {
				this.add('cue', '[Quote]', line);
				this.blocks((token as Tokens.Blockquote).tokens, kind);
			} else if (token.type === 'table') this.add('cue', '[Table]', line);
			else if (token.type === 'code') this.add('cue', '[Settings as written]', line);
			else if (token.type === 'paragraph' && onlyImages(token as Tokens.Paragraph))
				for (const image of (token as Tokens.Paragraph).tokens.filter((one) => one.type === 'image'))
					this.add('cue', `[Picture: ${(image as Tokens.Image).text}]`, line);
			else if (token.type === 'paragraph' || token.type === 'text')
				this.add(kind, plainText([token], 'spoken'), line);
		}
	}
}

const onlyImages = ({ tokens }: Tokens.Paragraph): boolean =>
	tokens.some((one) => one.type === 'image') &&
	tokens.every((one) => one.type === 'image' || (one.type === 'text' && one.raw.trim() === ''));

/**
 * An article as a script: what is said in words, plates and pictures as cues, steps one by one, notes marked as said
 * beside the text. Directives that find nothing are left out and named in `gaps`. Nothing throws for what was typed.
 */
export function scriptOf({ title, standfirst, source }: Spoken, data: ArticleData): Script {
	const reader = new Reader(data);
	reader.open('Opening', 1);
	reader.add('say', /[.?!]$/.test(title) ? title : `${title}.`, 1);
	reader.add('say', standfirst, 1);
	const { tokens, page } = setArticle(source, data, () => '');
	reader.blocks(tokens);
	return {
		title,
		sections: reader.sections.filter((section) => section.lines.length > 0),
		gaps: page.errors.map(({ line, message }) => ({ line, message }))
	};
}
