import type { Token } from 'marked';
import { isDirective, type DirectiveToken } from './directive-syntax';
import type { ArticleData } from './data';
import type { Draw, Press, Printed, Problem } from './directives/shape';
import { errorHtml } from './error-html';
import { Footnotes } from './footnotes';
import { isSafeLink, isSameSitePath } from './links';
import { childrenOf, printMarkdown, type Placed } from './markdown';
import { countWords, plainText } from './plain-text';
import { pictureOf, pictureOfParagraph } from './pictures/settle-picture';
import { plateKey } from './plates/spec';
import { emptyPage, type Rendered } from './rendered';
import { isLate, runDirective } from './run-directive';
import { termsHtml, termsPlain } from './terms';
import { slugOf } from '../shared/slug';

const unique = <T>(items: T[], key: (item: T) => string): T[] => [
	...new Map(items.map((item) => [key(item), item])).values()
];

/** Sets one article: settles its tokens from the innermost outwards, prints them, collects what they leave behind. */
export class Setting {
	private readonly out = emptyPage();
	private readonly ids = new Map<string, number>();
	private readonly waiting: DirectiveToken[] = [];
	private readonly terms = new Set<string>();
	private step = 0;

	constructor(
		private readonly data: ArticleData,
		private readonly draw: Draw,
		private readonly platesAt: string
	) {}

	/** The page of a token tree. */
	set(tokens: Token[]): Rendered {
		// Numbered before anything is printed, because a note in a container is printed with it.
		const footnotes = new Footnotes(tokens, (token, problem) =>
			this.fault(token, 'footnote', problem, token.type === 'footnote-ref' ? 'inline' : 'block')
		);
		this.settle(tokens, null);
		for (const token of this.waiting) this.directive(token, null);
		return this.finish(tokens, footnotes);
	}

	private settle(tokens: Token[], around: DirectiveToken | null): void {
		for (const token of tokens as Placed[]) {
			if (isDirective(token)) {
				this.settle(childrenOf(token), token);
				// Only the page itself has late ones; elsewhere they are out of place.
				if (isLate(token) && !around) this.waiting.push(token);
				else this.directive(token, around);
				continue;
			}
			this.settle(childrenOf(token), around);
			if (token.type === 'heading') this.heading(token);
			else if (token.type === 'image') this.image(token);
			else if (token.type === 'paragraph') token.printed = pictureOfParagraph(token, this.data);
			else if (token.type === 'link' && !isSafeLink(String(token.href))) {
				token.refused = this.fault(token, 'link', {
					message:
						'This link leads nowhere a reader can go. Use an https:// address, a mail address, or a path of this site that begins with /.',
					nearest: []
				});
			}
		}
	}

	private fault(
		token: { line?: number },
		name: string,
		problem: Problem,
		level: 'inline' | 'block' = 'inline'
	): string {
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
		this.step = 0;
	}

	private image(token: Placed & { href?: string; text?: string }): void {
		const problem = !isSameSitePath(token.href ?? '')
			? 'An image must come from this site: its path begins with /.'
			: (token.text ?? '').trim() === ''
				? 'This image has no text for those who cannot see it. Write it between the square brackets.'
				: null;
		const set = problem === null ? pictureOf(token, this.data) : { problem };
		if (set?.problem) token.refused = this.fault(token, 'image', { message: set.problem, nearest: [] });
		else token.printed = set?.html;
	}

	private pressFor(token: DirectiveToken): Press {
		const { data, draw, platesAt, out } = this;
		const tokens = token.level === 'container' ? (token.tokens ?? []) : null;
		if (token.name === 'step') this.step += 1;
		return {
			data,
			draw,
			platesAt,
			call: { name: token.name, attributes: token.attributes, line: token.line ?? 1 },
			inside: tokens && {
				tokens,
				html: printMarkdown(tokens),
				plain: plainText(tokens),
				spoken: plainText(tokens, 'spoken')
			},
			headings: out.headings,
			termsSoFar: this.terms,
			step: this.step
		};
	}

	private directive(token: DirectiveToken, around: DirectiveToken | null): void {
		const press = this.pressFor(token);
		const result = runDirective(token, press, around);
		if (result.ok) {
			const { html, plain, spoken, plate } = result.value;
			Object.assign(token, { html, plain, spoken: spoken ?? plain });
			if (plate) token.plate = { key: plateKey(plate), title: plate.title };
			this.keep(result.value);
			return;
		}
		const level = token.level === 'inline' ? 'inline' : 'block';
		// What was written inside stays to be seen, whatever is wrong around it.
		token.html = this.fault(token, token.name, result.problem, level) + (press.inside?.html ?? '');
		token.plain = press.inside?.plain ?? '';
		token.spoken = press.inside?.spoken ?? '';
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
		for (const slug of printed.terms ?? []) this.terms.add(slug);
	}

	private finish(tokens: Token[], footnotes: Footnotes): Rendered {
		const { out } = this;
		const { cells, profiles, campaigns } = out.uses;
		out.uses.terms = [...this.terms];
		out.blocks = [
			...tokens.map((token) => ({ line: (token as Placed).line ?? 1, html: printMarkdown([token]) })),
			{ line: null, html: footnotes.html() },
			{ line: null, html: termsHtml(this.data, out.uses.terms) }
		].filter(({ line, html }) => line !== null || html !== '');
		out.html = out.blocks.map(({ html }) => html).join('');
		out.plain = [plainText(tokens), footnotes.plain(), termsPlain(this.data, out.uses.terms)]
			.filter((text) => text !== '')
			.join('\n\n');
		out.wordCount = countWords(out.plain);
		out.errors.sort((a, b) => a.line - b.line);
		out.plates = unique(out.plates, (plate) => plate.key);
		out.cautions = [...new Set(out.cautions)];
		out.uses.cells = unique(cells, (cell) => `${cell.campaign}/${cell.profile}/${cell.workload}`);
		const named = [...profiles, ...cells.map(({ campaign, profile }) => ({ campaign, profile }))];
		out.uses.profiles = unique(named, (one) => `${one.campaign}/${one.profile}`);
		out.uses.campaigns = [...new Set([...campaigns, ...named.map((one) => one.campaign)])];
		return out;
	}
}
