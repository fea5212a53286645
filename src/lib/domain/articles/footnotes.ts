import type { Token } from 'marked';
import type { FootnoteRef, FootnoteText } from './footnote-syntax';
import { element } from './html';
import { eachToken, printMarkdown } from './markdown';
import { plainText } from './plain-text';
import type { Problem } from './directives/shape';
import { nearest } from '../shared/nearest';

const isRef = (token: Token): token is FootnoteRef => token.type === 'footnote-ref';
const isText = (token: Token): token is FootnoteText => token.type === 'footnote-text';

interface Note {
	number: number;
	text: FootnoteText;
	/** How often it is pointed to. */
	uses: number;
}

/** Tells of a fault and gives the markup that stands in its place. */
type Fault = (token: FootnoteRef | FootnoteText, problem: Problem) => string;

const anchorOf = (number: number, use: number): string =>
	use === 1 ? `fr-${number}` : `fr-${number}-${use}`;

/** Footnotes of one article: numbered by where they are first pointed to, printed together at the end. */
export class Footnotes {
	private readonly notes = new Map<string, Note>();

	/** Numbers every mark of the page; what is missing, doubled or never pointed to is an error in its place. */
	constructor(tokens: Token[], fault: Fault) {
		const texts = new Map<string, FootnoteText>();
		const refs: FootnoteRef[] = [];
		const doubled: FootnoteText[] = [];
		eachToken(tokens, (token) => {
			if (isRef(token)) refs.push(token);
			if (!isText(token)) return;
			token.plain = '';
			token.spoken = '';
			token.html = '';
			if (texts.has(token.label)) doubled.push(token);
			else texts.set(token.label, token);
		});
		const inFootnotes = new Set<Token>();
		for (const text of texts.values()) eachToken(text.tokens ?? [], (token) => inFootnotes.add(token));
		for (const ref of refs) {
			ref.plain = '';
			ref.spoken = '';
			const text = texts.get(ref.label);
			if (inFootnotes.has(ref)) {
				ref.html = fault(ref, {
					message: 'A footnote cannot point to a footnote. Write it into the text.',
					nearest: []
				});
			} else if (text) this.point(ref, text);
			else
				ref.html = fault(ref, {
					message: `There is no footnote “${ref.label}”. Write its text on a line of its own: [^${ref.label}]: and the words.`,
					nearest: nearest(ref.label, [...texts.keys()])
				});
		}
		for (const text of doubled)
			text.html = fault(text, {
				message: `There are two footnotes “${text.label}”. Give this one another name.`,
				nearest: []
			});
		for (const text of texts.values()) {
			if (!this.notes.has(text.label))
				text.html = fault(text, {
					message: `Nothing points to the footnote “${text.label}”. Write [^${text.label}] where it belongs, or take it out.`,
					nearest: []
				});
		}
	}

	private point(ref: FootnoteRef, text: FootnoteText): void {
		const note = this.notes.get(ref.label) ?? { number: this.notes.size + 1, text, uses: 0 };
		note.uses += 1;
		this.notes.set(ref.label, note);
		const { number, uses } = note;
		ref.html = element(
			'sup',
			{ class: 'footnote-ref' },
			element(
				'a',
				{ id: anchorOf(number, uses), href: `#fn-${number}`, 'aria-label': `Footnote ${number}` },
				String(number)
			)
		);
	}

	/** The notes with their ways back; empty where there are none. Their insides must be settled. */
	html(): string {
		const items = [...this.notes.values()].map(({ number, text, uses }) => {
			const back = Array.from({ length: uses }, (_, at) =>
				element(
					'a',
					{
						class: 'footnote-back',
						href: `#${anchorOf(number, at + 1)}`,
						'aria-label': `Back to the text, from footnote ${number}${uses > 1 ? `, place ${at + 1}` : ''}`
					},
					'back'
				)
			).join(' ');
			return element(
				'li',
				{ id: `fn-${number}`, 'data-line': text.line },
				`${printMarkdown(text.tokens ?? [])} ${back}`
			);
		});
		return items.length === 0
			? ''
			: element('section', { class: 'footnotes', 'aria-label': 'Footnotes' }, `<ol>${items.join('')}</ol>`);
	}

	/** The notes as plain text, one after another. */
	plain(): string {
		return [...this.notes.values()].map(({ text }) => plainText(text.tokens ?? [])).join('\n\n');
	}
}
