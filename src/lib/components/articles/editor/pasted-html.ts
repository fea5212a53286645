import TurndownService from 'turndown';
import { isSafeLink } from '../../../domain/articles/links';
import { markdownTable } from '../../../domain/articles/pasted-table';

/** What was pasted, as Markdown, and how many pictures of it were left out. */
export interface Pasted {
	markdown: string;
	pictures: number;
}

const styleOf = (element: Element): string => (element.getAttribute('style') ?? '').toLowerCase();

function replaceTag(element: Element, tag: string): Element {
	const other = element.ownerDocument.createElement(tag);
	other.append(...element.childNodes);
	element.replaceWith(other);
	return other;
}

const unwrap = (element: Element) => element.replaceWith(...element.childNodes);

/** A word processor's list is paragraphs that say of themselves which level they are and how they are marked. */
function gatherLists(body: Element): void {
	let lists: Element[] = [];
	for (const paragraph of [...body.querySelectorAll('p')]) {
		const level = Number(/mso-list:[^;]*level(\d+)/.exec(styleOf(paragraph))?.[1] ?? 0);
		if (level === 0) {
			lists = [];
			continue;
		}
		const mark = [...paragraph.querySelectorAll('span')].find((one) =>
			styleOf(one).includes('mso-list:ignore')
		);
		const tag = /^\s*(?:\d+|[a-z]{1,3}|[ivxlc]+)[.)]/i.test(mark?.textContent ?? '') ? 'ol' : 'ul';
		mark?.remove();
		if (paragraph.previousElementSibling !== lists[0]) lists = [];
		lists = lists.slice(0, level);
		while (lists.length < level) {
			const list = body.ownerDocument.createElement(tag);
			const outer = lists.at(-1);
			if (outer) (outer.lastElementChild ?? outer).append(list);
			else paragraph.before(list);
			lists.push(list);
		}
		lists.at(-1)?.append(replaceTag(paragraph, 'li'));
	}
}

/** Bold and italic that are said by style alone; and what calls itself bold and is not. */
function readStyles(body: Element): void {
	for (const element of [...body.querySelectorAll('b, strong, i, em, span')]) {
		const style = styleOf(element);
		const bold = /(?:^|[;\s])font-weight:\s*(?:bold|[6-9]00)/.test(style);
		const italic = /(?:^|[;\s])font-style:\s*italic/.test(style);
		if (/^(?:B|STRONG)$/.test(element.tagName) && /(?:^|[;\s])font-weight:\s*(?:normal|400)/.test(style))
			unwrap(element);
		else if (element.tagName === 'SPAN') {
			const tags = [bold && 'strong', italic && 'em'].filter((tag) => tag !== false);
			for (const tag of tags) {
				const wrapper = element.ownerDocument.createElement(tag);
				wrapper.append(...element.childNodes);
				element.append(wrapper);
			}
			unwrap(element);
		}
	}
}

/** The page's title is its own: what was the highest heading begins a part. */
function lowerHeadings(body: Element): void {
	for (const title of body.querySelectorAll('p.MsoTitle, p[class*="Title"]')) replaceTag(title, 'h1');
	if (!body.querySelector('h1')) return;
	for (const level of [5, 4, 3, 2, 1])
		for (const heading of [...body.querySelectorAll(`h${level}`)]) replaceTag(heading, `h${level + 1}`);
}

/** Takes out what is no text, and puts plain elements in place of a word processor's own. Says how many pictures went. */
function tidy(body: Element): number {
	for (const element of body.querySelectorAll('style, script, meta, link, title, xml, o\\:p, colgroup')) {
		if (element.tagName.toLowerCase() === 'o:p') unwrap(element);
		else element.remove();
	}
	const pictures = body.querySelectorAll('img, svg, v\\:imagedata, picture');
	for (const picture of pictures) picture.remove();
	gatherLists(body);
	readStyles(body);
	lowerHeadings(body);
	for (const link of body.querySelectorAll('a'))
		if (!isSafeLink(link.getAttribute('href') ?? '') || link.getAttribute('href')?.startsWith('#'))
			unwrap(link);
	// A paragraph in an item or a cell is only how it was stored.
	for (const paragraph of body.querySelectorAll('li > p:only-child, td > p, th > p')) {
		if (paragraph.nextElementSibling) paragraph.after(' ');
		unwrap(paragraph);
	}
	return pictures.length;
}

const service = new TurndownService({
	headingStyle: 'atx',
	hr: '---',
	bulletListMarker: '-',
	codeBlockStyle: 'fenced',
	emDelimiter: '*'
});
service.addRule('struck', { filter: ['del', 's'], replacement: (text) => `~~${text}~~` });
service.addRule('item', {
	filter: 'li',
	replacement(text, node) {
		const list = node.parentElement;
		const at = list ? [...list.children].indexOf(node) : 0;
		const mark = list?.tagName === 'OL' ? `${at + 1}. ` : '- ';
		const lines = text
			.trim()
			.replace(/\n{2,}/g, '\n')
			.split('\n');
		return `${mark}${lines.join(`\n${' '.repeat(mark.length)}`)}${node.nextElementSibling ? '\n' : ''}`;
	}
});
service.addRule('table', {
	filter: 'table',
	replacement(_text, node) {
		const rows = [...(node as HTMLTableElement).querySelectorAll('tr')].map((row) =>
			[...row.children].map((cell) => service.turndown(cell.innerHTML === '' ? ' ' : (cell as HTMLElement)))
		);
		return `\n\n${markdownTable(rows)}\n\n`;
	}
});

const shaped =
	'h1, h2, h3, h4, h5, h6, ul, ol, table, blockquote, strong, em, b, i, a[href], hr, [style*="mso-list"], [style*="font-weight"], [style*="font-style"]';

/**
 * What a word processor, a browser or a spreadsheet put on the clipboard, as Markdown; null where its HTML says no more
 * than its text does.
 */
export function pastedHtml(html: string, parser: DOMParser = new DOMParser()): Pasted | null {
	// Word writes what only it reads between conditional comments; some are not even comments to others.
	const { body } = parser.parseFromString(html.replace(/<!\[(?:if|endif)[^>]*>/gi, ''), 'text/html');
	if (!body.querySelector(shaped) && !body.querySelector('img')) return null;
	const pictures = tidy(body);
	const markdown = service
		.turndown(body)
		.replace(/\u00a0/g, ' ')
		.replace(/[ \t]+$/gm, '')
		.replace(/\n{3,}/g, '\n\n')
		.trim();
	return { markdown, pictures };
}
