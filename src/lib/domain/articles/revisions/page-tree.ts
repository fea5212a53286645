import { escapeHtml } from '../html';

/** An element of a page, as far as a comparison of two pages looks at it. */
export interface PageElement {
	tag: string;
	attributes: Record<string, string>;
	children: PageNode[];
}

/** A page as a tree: elements and the texts between them. */
export type PageNode = string | PageElement;

export const isElement = (node: PageNode): node is PageElement => typeof node !== 'string';

const empty = new Set(['br', 'hr', 'img', 'source']);

const openTag = (tag: string, attributes: Record<string, string>): string =>
	`<${tag}${Object.entries(attributes)
		.map(([name, value]) => ` ${name}="${escapeHtml(value)}"`)
		.join('')}>`;

/** Markup around other markup, by an element of the page. */
export const wrap = ({ tag, attributes }: PageElement, inner: string): string =>
	empty.has(tag) ? openTag(tag, attributes) : `${openTag(tag, attributes)}${inner}</${tag}>`;

/** The markup of a tree. */
export const printNode = (node: PageNode): string =>
	isElement(node) ? wrap(node, node.children.map(printNode).join('')) : escapeHtml(node);

/** The words of a tree, without marks. */
export const textOf = (node: PageNode): string =>
	isElement(node) ? node.children.map(textOf).join(' ') : node;

/** What may differ between two pages that read the same: where it stood in the source, and names made from counting. */
const passing = new Set(['data-line', 'id', 'aria-describedby', 'aria-labelledby']);

/** The same for two trees exactly when a reader would see the same. */
export function keyOf(node: PageNode): string {
	if (!isElement(node)) return node.replace(/\s+/g, ' ');
	const attributes = Object.entries(node.attributes)
		.filter(([name]) => !passing.has(name) && !name.startsWith('data-plate'))
		.map(([name, value]) => `${name}=${value.replace(/\/plates\/[\w.-]+/g, '')}`)
		.sort();
	return `<${node.tag} ${attributes.join(' ')}>${node.children.map(keyOf).join('')}</>`;
}

export const hasClass = (node: PageNode, name: string): node is PageElement =>
	isElement(node) && (node.attributes.class ?? '').split(' ').includes(name);

/** Every element of a kind in a tree, outermost first. */
export const findAll = (node: PageNode, tag: string): PageElement[] =>
	isElement(node)
		? [...(node.tag === tag ? [node] : []), ...node.children.flatMap((child) => findAll(child, tag))]
		: [];
