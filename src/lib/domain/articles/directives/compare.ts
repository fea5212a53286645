import type { Token } from 'marked';
import { isDirective } from '../directive-syntax';
import { element, escapeHtml } from '../html';
import { attribute } from './lookup';
import { asSentence, blocksOf, emptyInside } from './containers';
import { directive, found, missing, type Inside } from './shape';

const mostSides = 4;
const isSide = (token: Token): boolean => isDirective(token) && token.name === 'side';

/** `:::side{title=}`: one column of a comparison. */
export const side = directive<Inside>({
	name: 'side',
	level: 'container',
	words: 'One column of a comparison, with its heading.',
	attributes: [attribute.text('title', 'what this column is of', true)],
	holds: ['caution'],
	within: 'compare',
	sample: 'What speaks for it.',
	resolve: (_call, _data, { inside }) => (inside && inside.html !== '' ? found(inside) : emptyInside('side')),
	render({ html, plain, spoken }, { call }) {
		const title = call.attributes.title ?? '';
		return {
			html: element(
				'section',
				{ class: 'compare-side', 'aria-label': title, 'data-line': call.line },
				element('p', { class: 'compare-side-title' }, escapeHtml(title)) + html
			),
			plain: `${title}\n\n${plain}`,
			spoken: `${asSentence(title)}\n\n${spoken}`
		};
	}
});

/** `:::compare{title=}`: two to four columns side by side, one under the other on a phone. */
export const compare = directive<Inside & { count: number }>({
	name: 'compare',
	level: 'container',
	words: 'Two to four columns with a heading each, side by side; one under the other on a phone.',
	attributes: [attribute.text('title', 'what is held against what')],
	holds: ['side'],
	sample:
		':::side{title="The one"}\nWhat speaks for it.\n:::\n\n:::side{title="The other"}\nWhat speaks for that.\n:::',
	resolve(_call, _data, { inside }) {
		const blocks = blocksOf(inside?.tokens ?? []);
		const stray = blocks.find((token) => !isSide(token));
		if (!inside || blocks.length < 2 || blocks.length > mostSides || stray) {
			return missing(
				`A comparison holds two to ${mostSides} columns and nothing beside them. Put each between :::side{title="…"} and :::.`
			);
		}
		return found({ ...inside, count: blocks.length });
	},
	render({ html, plain, spoken, count }, { call }) {
		const { title } = call.attributes;
		return {
			html: element(
				'section',
				{ class: `compare compare-${count}`, 'aria-label': title ?? 'Comparison', 'data-line': call.line },
				(title ? element('h3', {}, escapeHtml(title)) : '') + element('div', { class: 'compare-sides' }, html)
			),
			plain: title ? `${title}\n\n${plain}` : plain,
			spoken: title ? `${asSentence(title)}\n\n${spoken}` : spoken
		};
	}
});
