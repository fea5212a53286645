import { element, escapeHtml } from '../html';
import { attribute } from './lookup';
import { directive, found, missing, type Heading } from './shape';

const depths = ['2', '3'] as const;

const link = ({ id, text }: Heading): string => element('a', { href: `#${id}` }, escapeHtml(text));

/** Headings of the second level, each with those of the third under it. */
function listOf(headings: readonly Heading[]): string {
	const items: string[] = [];
	let under: string[] = [];
	const close = () => {
		if (under.length > 0)
			items.push(`${items.pop()?.replace(/<\/li>$/, '') ?? '<li>'}<ol>${under.join('')}</ol></li>`);
		under = [];
	};
	for (const heading of headings) {
		if (heading.level > 2) under.push(`<li>${link(heading)}</li>`);
		else {
			close();
			items.push(`<li>${link(heading)}</li>`);
		}
	}
	close();
	return `<ol>${items.join('')}</ol>`;
}

/** `::contents{depth=}`: the headings of the article, with links to them. */
export const contents = directive<Heading[]>({
	name: 'contents',
	level: 'block',
	words: 'The headings of the article, each with a link to it.',
	attributes: [attribute.oneOf('depth', 'down to which level of heading; 2 if left out', depths)],
	late: true,
	resolve(call, _data, { headings }) {
		const depth = Number(call.attributes.depth ?? 2);
		const shown = headings.filter(({ level, text }) => level <= depth && text !== '');
		return shown.length > 0
			? found(shown)
			: missing('There are no headings to list. A heading begins with ## and a space.');
	},
	render: (headings, { call }) => ({
		// Tailwind has a class 'contents' of its own.
		html: element(
			'nav',
			{ class: 'contents-list', 'aria-label': 'Contents', 'data-line': call.line },
			`<p class="contents-title">Contents</p>${listOf(headings)}`
		),
		plain: '',
		spoken: ''
	})
});
