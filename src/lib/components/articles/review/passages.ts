import { standingOf } from '../../../domain/articles/quote';

/** Where a passage is on the page, and whether its words still stand as they were quoted. */
export interface Passage {
	range: Range;
	exact: boolean;
}

/** The page's text with the node that each part of it comes from. */
function textOf(root: HTMLElement): { text: string; nodes: { node: Text; from: number }[] } {
	const walker = document.createTreeWalker(root, NodeFilter.SHOW_TEXT);
	const nodes: { node: Text; from: number }[] = [];
	let text = '';
	for (let node = walker.nextNode(); node; node = walker.nextNode()) {
		// Drawings are no prose, and their words would break a passage that runs on after them.
		if (!(node instanceof Text) || node.parentElement?.closest('svg, details')) continue;
		nodes.push({ node, from: text.length });
		text += node.data;
		// Blocks end words even where no space stands between their tags.
		if (
			!/\s$/.test(node.data) &&
			node.parentElement?.closest('p, h1, h2, h3, li, td, th')?.lastChild === node
		)
			text += ' ';
	}
	return { text, nodes };
}

/** Finds each quote on the page; those that no longer stand there are left out. */
export function findPassages(
	root: HTMLElement,
	quotes: { id: number; quote: string }[]
): Map<number, Passage> {
	const { text, nodes } = textOf(root);
	const placeOf = (offset: number) => {
		const found = nodes.findLast(({ from }) => from <= offset);
		return found && { node: found.node, offset: Math.min(offset - found.from, found.node.length) };
	};
	const passages = new Map<number, Passage>();
	for (const { id, quote } of quotes) {
		const standing = quote === '' ? null : standingOf(quote, text);
		const start = standing && placeOf(standing.from);
		const end = standing && placeOf(standing.to);
		if (!standing || !start || !end) continue;
		const range = document.createRange();
		range.setStart(start.node, start.offset);
		range.setEnd(end.node, end.offset);
		passages.set(id, { range, exact: standing.exact });
	}
	return passages;
}

/** Marks passages without touching the page's markup, where the browser can. */
export function markPassages(name: string, ranges: Range[]): void {
	if (!('highlights' in CSS)) return;
	if (ranges.length === 0) CSS.highlights.delete(name);
	else CSS.highlights.set(name, new Highlight(...ranges));
}
