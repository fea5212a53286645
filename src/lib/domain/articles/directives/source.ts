import { element, escapeHtml } from '../html';
import { directive, found, missing } from './shape';

/**
 * `:source{text= from=}`: words or a number that are not the bench's, with where they come from. The page prints both,
 * so that a reader sees it; the claims leave it alone.
 */
export const source = directive<{ text: string; from: string }>({
	name: 'source',
	level: 'inline',
	words: 'A number from elsewhere, with where it comes from.',
	attributes: [
		{ name: 'text', required: true, words: 'the number as it is to stand', values: () => null },
		{
			name: 'from',
			required: true,
			words: 'where it comes from, such as the maker’s sheet',
			values: () => null
		}
	],
	resolve({ attributes: { text = '', from = '' } }) {
		if (text.trim() === '' || from.trim() === '')
			return missing(
				'A number from elsewhere needs both: text= as it is to stand, and from= where it comes from.'
			);
		return found({ text: text.trim(), from: from.trim() });
	},
	render: ({ text, from }) => ({
		html: element('span', { class: 'sourced' }, `${escapeHtml(text)} (${escapeHtml(from)})`),
		plain: `${text} (${from})`
	})
});
