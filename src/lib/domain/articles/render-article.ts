import type { Token } from 'marked';
import { isDirective, type DirectiveToken } from './directive-syntax';
import type { ArticleData } from './data';
import type { BoundFigure, CautionTopic, Draw, Printed, Problem, UsedCell } from './directives/shape';
import { element, escapeHtml } from './html';
import { isSafeLink, isSameSitePath } from './links';
import { refusalOf } from './limits';
import { eachToken, parseMarkdown, printInside, printMarkdown, type Placed } from './markdown';
import { countWords, plainText } from './plain-text';
import { plateKey, type PlateSpec } from './plates/spec';
import { runDirective } from './run-directive';
import { slugOf } from '../shared/slug';

/** What cannot be printed, where, and what would be near. */
export interface DirectiveError {
	/** Line of the source, from 1. */
	line: number;
	/** Name of the directive; 'link', 'image' or 'source' for what is none. */
	directive: string;
	message: string;
	nearest: string[];
}

export interface Heading {
	level: number;
	text: string;
	id: string;
	line: number;
}

/** An article as set: its page, not yet sanitised, and all that stands on it. */
export interface Rendered {
	html: string;
	/** The same page block by block, each with the line of the source it begins on; null for what has none. */
	blocks: { line: number | null; html: string }[];
	/** Each plate once, with its key. */
	plates: { key: string; spec: PlateSpec }[];
	errors: DirectiveError[];
	bound: BoundFigure[];
	uses: {
		campaigns: string[];
		profiles: { campaign: string; profile: string }[];
		cells: UsedCell[];
	};
	/** Topics of the cautions the page gives, beside a step or on their own. */
	cautions: CautionTopic[];
	hasDisclosure: boolean;
	headings: Heading[];
	wordCount: number;
	plain: string;
}

export interface RenderOptions {
	/** Where the plates' files are, with a slash at its end. */
	platesAt?: string;
	/** Gives the token tree, as a reader that knows the text from before does. */
	read?: (source: string) => Token[];
}

const empty = (): Rendered => ({
	html: '',
	blocks: [],
	plates: [],
	errors: [],
	bound: [],
	uses: { campaigns: [], profiles: [], cells: [] },
	cautions: [],
	hasDisclosure: false,
	headings: [],
	wordCount: 0,
	plain: ''
});

const unique = <T>(items: T[], key: (item: T) => string): T[] => [
	...new Map(items.map((item) => [key(item), item])).values()
];

function errorHtml(error: DirectiveError, level: 'inline' | 'block'): string {
	const near = error.nearest.length > 0 ? ` Near: ${error.nearest.join(', ')}.` : '';
	return element(
		level === 'inline' ? 'span' : 'p',
		{ class: 'directive-error', role: 'note', 'data-line': error.line },
		escapeHtml(`${error.message}${near}`)
	);
}

/** Collects what the directives, links, images and headings of one article leave behind. */
class Setting {
	readonly out = empty();
	private readonly ids = new Map<string, number>();

	constructor(
		private readonly data: ArticleData,
		private readonly draw: Draw,
		private readonly platesAt: string
	) {}

	settle(token: Placed): void {
		if (isDirective(token)) this.directive(token, token.line ?? 1);
		else if (token.type === 'heading') this.heading(token);
		else if (token.type === 'image') this.image(token);
		else if (token.type === 'link' && !isSafeLink(String(token.href))) {
			token.refused = this.fault(token, 'link', {
				message:
					'This link leads nowhere a reader can go. Use an https:// address, a mail address, or a path of this site that begins with /.',
				nearest: []
			});
		}
	}

	private fault(token: Placed, name: string, problem: Problem, level: 'inline' | 'block' = 'inline'): string {
		const error = { line: token.line ?? 1, directive: name, ...problem };
		this.out.errors.push(error);
		return errorHtml(error, level);
	}

	private heading(token: Placed): void {
		const text = plainText([token]);
		const base = `s-${slugOf(text) || 'part'}`;
		const seen = this.ids.get(base) ?? 0;
		this.ids.set(base, seen + 1);
		token.id = seen === 0 ? base : `${base}-${seen + 1}`;
		const level = Math.max(2, 'depth' in token ? Number(token.depth) : 2);
		this.out.headings.push({ level, text, id: token.id, line: token.line ?? 1 });
	}

	private image(token: Placed & { href?: string; text?: string }): void {
		const problem = !isSameSitePath(token.href ?? '')
			? 'An image must come from this site: its path begins with /.'
			: (token.text ?? '').trim() === ''
				? 'This image has no text for those who cannot see it. Write it between the square brackets.'
				: null;
		if (problem !== null) token.refused = this.fault(token, 'image', { message: problem, nearest: [] });
	}

	private directive(token: DirectiveToken, line: number): void {
		const level = token.level === 'inline' ? 'inline' : 'block';
		if (token.level === 'container') return this.container(token, line);
		const call = { name: token.name, attributes: token.attributes, line };
		const { data, draw, platesAt } = this;
		const result = runDirective(token, { data, draw, call, platesAt });
		if (result.ok) {
			token.html = result.value.html;
			token.plain = result.value.plain;
			this.keep(result.value);
		} else {
			token.html = this.fault(token as Placed, token.name, result.problem, level);
			token.plain = '';
		}
	}

	/** The one container there is: a note in the margin. Its inside is settled after it, and printed last. */
	private container(token: DirectiveToken, line: number): void {
		const message =
			token.fault ??
			(token.name === 'note'
				? null
				: `There is no “${token.name}” to put around text. A note in the margin is :::note.`);
		if (message !== null) {
			token.html = this.fault(token as Placed, token.name, { message, nearest: ['note'] }, 'block');
			token.tokens = [];
			token.plain = '';
		} else token.line = line;
	}

	private keep(printed: Printed): void {
		const { out } = this;
		if (printed.bound) out.bound.push(printed.bound);
		if (printed.plate) out.plates.push({ key: plateKey(printed.plate), spec: printed.plate });
		if (printed.disclosure) out.hasDisclosure = true;
		out.cautions.push(...(printed.cautions ?? []));
		out.uses.cells.push(...(printed.cells ?? []));
		out.uses.profiles.push(...(printed.profiles ?? []));
		out.uses.campaigns.push(...(printed.campaigns ?? []));
	}

	finish(tokens: Token[]): Rendered {
		const { out } = this;
		closeNotes(tokens);
		out.blocks = tokens.map((token) => ({ line: (token as Placed).line ?? 1, html: printMarkdown([token]) }));
		out.html = out.blocks.map(({ html }) => html).join('');
		out.plain = plainText(tokens);
		out.wordCount = countWords(out.plain);
		out.plates = unique(out.plates, (plate) => plate.key);
		out.cautions = [...new Set(out.cautions)];
		const { cells, profiles, campaigns } = out.uses;
		out.uses.cells = unique(cells, (cell) => `${cell.campaign}/${cell.profile}/${cell.workload}`);
		const named = [...profiles, ...cells.map(({ campaign, profile }) => ({ campaign, profile }))];
		out.uses.profiles = unique(named, (one) => `${one.campaign}/${one.profile}`);
		out.uses.campaigns = [...new Set([...campaigns, ...named.map((one) => one.campaign)])];
		return out;
	}
}

/** Prints the notes once everything in them is settled, innermost first. */
function closeNotes(tokens: Token[]): void {
	const notes: DirectiveToken[] = [];
	eachToken(tokens, (token) => {
		if (isDirective(token) && token.level === 'container' && token.html === undefined) notes.push(token);
	});
	for (const note of notes.reverse()) {
		const title = note.attributes.title;
		note.html = element(
			'aside',
			{ class: 'margin-note', 'data-line': Number(note.line ?? 1) },
			(title ? element('p', { class: 'margin-note-title' }, escapeHtml(title)) : '') + printInside(note)
		);
	}
}

/**
 * Sets an article: Markdown and directives in, page and everything found out about it. The same function makes
 * the preview, the edition and the site's page. Its HTML must still pass the sanitiser, which is the last step.
 * Nothing throws for what a writer typed: it is an error in its place.
 * @param draw gives the SVG of a plate
 */
export function renderArticle(
	source: string,
	data: ArticleData,
	draw: Draw,
	{ platesAt = 'plates/', read = parseMarkdown }: RenderOptions = {}
): Rendered {
	const refusal = refusalOf(source);
	if (refusal) return refused(refusal.message, refusal.line);
	let tokens: Token[];
	try {
		tokens = read(source);
	} catch (error) {
		if (!(error instanceof RangeError)) throw error;
		return refused(
			'This text is nested too deep to be set. Take some levels out. What you typed is kept.',
			1
		);
	}
	const setting = new Setting(data, draw, platesAt);
	eachToken(tokens, (token) => setting.settle(token));
	return setting.finish(tokens);
}

function refused(message: string, line: number): Rendered {
	const error: DirectiveError = { line, directive: 'source', message, nearest: [] };
	const html = errorHtml(error, 'block');
	return { ...empty(), errors: [error], html, blocks: [{ line, html }] };
}
