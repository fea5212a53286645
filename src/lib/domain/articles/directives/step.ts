import { element, escapeHtml } from '../html';
import { attribute } from './lookup';
import { asSentence, emptyInside } from './containers';
import { directive, found, type Inside } from './shape';

/** `:::step{title=}`: one thing to do, numbered since the last heading, with its caution beside it and a box to tick on paper. */
export const step = directive<Inside>({
	name: 'step',
	level: 'container',
	words:
		'One thing to do, as a numbered card. A caution inside stands beside it; on paper there is a box to tick.',
	attributes: [attribute.text('title', 'what to do, in a few words', true)],
	holds: ['caution', 'plate', 'gallery'],
	sample: 'How it is done, and how one sees that it worked.',
	resolve: (_call, _data, { inside }) => (inside && inside.html !== '' ? found(inside) : emptyInside('step')),
	render({ html, plain, spoken }, { call, step: number }) {
		const title = call.attributes.title ?? '';
		const head =
			element('span', { class: 'step-card-number' }, String(number)) +
			element('span', { class: 'step-card-title' }, escapeHtml(title));
		return {
			html: element(
				'section',
				{ class: 'step-card', 'aria-label': `Step ${number}: ${title}`, 'data-line': call.line },
				element('p', { class: 'step-card-head' }, head) + element('div', { class: 'step-card-body' }, html)
			),
			plain: `${number}. ${title}\n\n${plain}`,
			spoken: `Step ${number}. ${asSentence(title)}\n\n${spoken}`
		};
	}
});
