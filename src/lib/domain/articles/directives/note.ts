import { element, escapeHtml } from '../html';
import { attribute } from './lookup';
import { emptyInside } from './containers';
import { directive, found, type Inside } from './shape';

/** `:::note{title=}`: an aside in the margin, in its place where there is no margin. */
export const note = directive<Inside>({
	name: 'note',
	level: 'container',
	words: 'A side note: in the margin of a wide screen, in its place on a phone.',
	attributes: [attribute.text('title', 'what it is about, in a few words')],
	holds: ['caution'],
	sample: 'What a reader may like to know on the way.',
	resolve: (_call, _data, { inside }) => (inside && inside.html !== '' ? found(inside) : emptyInside('note')),
	render({ html, plain, spoken }, { call }) {
		const { title } = call.attributes;
		return {
			html: element(
				'aside',
				{ class: 'margin-note', role: 'note', 'data-line': call.line },
				(title ? element('p', { class: 'margin-note-title' }, escapeHtml(title)) : '') + html
			),
			plain: title ? `${title}\n\n${plain}` : plain,
			spoken: title ? `${title}\n\n${spoken}` : spoken
		};
	}
});
