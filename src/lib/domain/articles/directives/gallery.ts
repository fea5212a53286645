import type { Token, Tokens } from 'marked';
import { element, escapeHtml } from '../html';
import { printMarkdown } from '../markdown';
import { attribute } from './lookup';
import { blocksOf } from './containers';
import { directive, found, missing } from './shape';

const columns = ['2', '3'] as const;
const mostPictures = 24;

/** The pictures a container holds; null where anything else stands among them. */
function picturesOf(tokens: readonly Token[]): Tokens.Image[] | null {
	const pieces = blocksOf(tokens).flatMap((block) =>
		block.type === 'paragraph' ? ((block as Tokens.Paragraph).tokens ?? []) : [block]
	);
	const pictures: Tokens.Image[] = [];
	for (const piece of pieces) {
		if (piece.type === 'image') pictures.push(piece as Tokens.Image);
		else if (piece.type !== 'br' && !(piece.type === 'text' && piece.raw.trim() === '')) return null;
	}
	return pictures;
}

function figure(picture: Tokens.Image): string {
	const caption = picture.title ?? '';
	const html = printMarkdown([{ type: 'text', raw: '', text: '', tokens: [{ ...picture, title: null }] }]);
	return element('figure', {}, html + (caption ? element('figcaption', {}, escapeHtml(caption)) : ''));
}

/** `:::gallery{columns=}`: pictures side by side, each with the caption it was given as its title. */
export const gallery = directive<Tokens.Image[]>({
	name: 'gallery',
	level: 'container',
	words:
		'Pictures side by side. Each needs a text in its square brackets; its caption stands in quotes behind the path.',
	attributes: [
		attribute.oneOf('columns', 'how many stand beside each other on a wide screen; 2 if left out', columns),
		attribute.text('title', 'what they show together')
	],
	holds: [],
	sample:
		'![What the first shows](/pictures/first.webp "Its caption")\n![What the second shows](/pictures/second.webp "Its caption")',
	resolve(_call, _data, { inside }) {
		const pictures = picturesOf(inside?.tokens ?? []);
		return pictures && pictures.length > 0 && pictures.length <= mostPictures
			? found(pictures)
			: missing(
					`A gallery holds pictures alone, ${mostPictures} at most: ![what it shows](/pictures/… "caption"), one under the other.`
				);
	},
	render(pictures, { call }) {
		const { title } = call.attributes;
		const shown = pictures.map(({ text, title: caption }) => (caption ? `${text}. ${caption}` : text));
		return {
			html: element(
				'div',
				{
					class: `gallery gallery-${call.attributes.columns ?? '2'}`,
					role: 'group',
					'aria-label': title ?? `${pictures.length} pictures`,
					'data-line': call.line
				},
				(title ? element('p', { class: 'gallery-title' }, escapeHtml(title)) : '') +
					element('div', { class: 'gallery-pictures' }, pictures.map(figure).join(''))
			),
			plain: [title ?? '', ...shown].filter((text) => text !== '').join('\n\n'),
			spoken: `[Pictures: ${title ?? pictures.map(({ text }) => text).join('; ')}]`
		};
	}
});
