import { JSDOM } from 'jsdom';
import type { PageNode } from '../../domain/articles/revisions/page-tree';

function nodeOf(node: Node): PageNode[] {
	if (node.nodeType === 3) return [node.textContent ?? ''];
	if (node.nodeType !== 1) return [];
	const element = node as Element;
	return [
		{
			tag: element.localName,
			attributes: Object.fromEntries([...element.attributes].map(({ name, value }) => [name, value])),
			children: [...element.childNodes].flatMap(nodeOf)
		}
	];
}

/** A page as a tree, for a comparison. Nothing in it runs or is loaded. */
export const pageTree = (html: string): PageNode[] =>
	[...new JSDOM(`<body>${html}</body>`).window.document.body.childNodes].flatMap(nodeOf);
