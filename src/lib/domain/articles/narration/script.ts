import type { Token, Tokens } from 'marked';
import type { ArticleData } from '../data';
import { isDirective, type DirectiveToken } from '../directive-syntax';
import { refusalOf } from '../limits';
import { parseMarkdown, type Placed } from '../markdown';
import { countWords, plainText } from '../plain-text';
import { plateKey } from '../plates/spec';
import { runDirective } from '../run-directive';
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

/** Reads one article's token tree into lines. */
class Reader {
	readonly sections: ScriptSection[] = [];
	readonly gaps: Script['gaps'] = [];
	private readonly names: string[];

	constructor(private readonly data: ArticleData) {
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

	/** Settles what directives within a sentence say, so that its text can be read. */
	private sentence(tokens: Token[]): string {
		for (const token of tokens) {
			if (isDirective(token)) token.plain = this.print(token)?.plain ?? '';
			else if ('tokens' in token && token.tokens) this.sentence(token.tokens);
		}
		return plainText(tokens);
	}

	private print(token: DirectiveToken) {
		const call = { name: token.name, attributes: token.attributes, line: Number(token.line ?? 1) };
		const result = runDirective(token, { data: this.data, draw: () => '', call, platesAt: '' });
		if (result.ok) return result.value;
		this.gaps.push({ line: call.line, message: result.problem.message });
		return null;
	}

	private directive(token: DirectiveToken, line: number, kind: LineKind): void {
		const printed = this.print(token);
		if (!printed) return;
		if (printed.plate) {
			this.add(
				'cue',
				`[Plate: ${printed.plate.title}]`,
				line,
				token.name === 'plate' ? plateKey(printed.plate) : null
			);
			return;
		}
		for (const text of (printed.spoken ?? printed.plain).split('\n')) {
			const cue = /^\[.*\]$/.test(text);
			const step = /^Step \d+: /.test(text);
			this.add(cue ? 'cue' : step ? 'step' : kind, text, line);
		}
	}

	private list(token: Tokens.List, kind: LineKind): void {
		for (const [at, item] of token.items.entries()) {
			const line = (item as Placed).line ?? 1;
			const [first, ...rest] = item.tokens;
			const number = token.ordered ? `${Number(token.start || 1) + at}. ` : '';
			const words = first ? this.sentence([first]) : '';
			this.add(
				token.ordered ? 'step' : kind,
				number === '' ? words : `Step ${number.replace('. ', ': ')}${words}`,
				line
			);
			this.blocks(rest, kind);
		}
	}

	blocks(tokens: Token[], kind: LineKind = 'say'): void {
		for (const token of tokens) {
			const line = (token as Placed).line ?? 1;
			if (isDirective(token)) {
				if (token.level === 'container') this.blocks(token.tokens ?? [], 'aside');
				else this.directive(token, line, kind);
			} else if (token.type === 'heading') {
				if (kind === 'say') this.open(this.sentence([token]), line);
				else this.add(kind, `${this.sentence([token])}.`, line);
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
				this.add(kind, this.sentence([token]), line);
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
	const refusal = refusalOf(source);
	if (refusal) return { title, sections: reader.sections, gaps: [refusal] };
	try {
		reader.blocks(parseMarkdown(source));
	} catch (error) {
		if (!(error instanceof RangeError)) throw error;
		reader.gaps.push({ line: 1, message: 'This text is nested too deep to be read.' });
	}
	return {
		title,
		sections: reader.sections.filter((section) => section.lines.length > 0),
		gaps: reader.gaps
	};
}
