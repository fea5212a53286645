import { element, escapeHtml } from '../html';
import { attribute } from './lookup';
import { emptyInside } from './containers';
import { directive, found, type Inside } from './shape';

/** `:::pull{by=}`: a sentence set large, with who said it. */
export const pull = directive<Inside>({
	name: 'pull',
	level: 'container',
	words: 'A sentence set large between the paragraphs, with who said it.',
	attributes: [attribute.text('by', 'who said it; left out for the article’s own words')],
	holds: [],
	sample: 'One sentence worth stopping at.',
	resolve: (_call, _data, { inside }) =>
		inside && inside.plain !== '' ? found(inside) : emptyInside('pull'),
	render({ html, plain, spoken }, { call }) {
		const { by } = call.attributes;
		return {
			html: element(
				'figure',
				{ class: 'pull', 'data-line': call.line },
				element('blockquote', {}, html) + (by ? element('figcaption', {}, escapeHtml(by)) : '')
			),
			plain: by ? `“${plain}” ${by}` : plain,
			// The article's own words are said once, where they stand.
			spoken: by ? `${by}: “${spoken}”` : ''
		};
	}
});
