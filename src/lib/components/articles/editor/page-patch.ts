import type { PageBlock } from '../../../domain/articles/page-blocks';

/** A block that stands on the page, with its own nodes. */
interface Standing extends PageBlock {
	nodes: ChildNode[];
}

/** Where a block of the page is, and the line it comes from. */
export interface PlacedLine {
	line: number;
	top: number;
}

/** Nodes of sanitised markup. */
function nodesOf(html: string): ChildNode[] {
	const template = document.createElement('template');
	template.innerHTML = html;
	return [...template.content.childNodes];
}

/**
 * The page beside the source. Only blocks that changed are sanitised and drawn; what stayed the same stays in place with
 * what a reader did to it, such as an opened table.
 */
export class PagePatch {
	private standing: Standing[] = [];

	/**
	 * @param host all its children are the page's
	 * @param sanitise the last step before markup is drawn
	 */
	constructor(
		private readonly host: HTMLElement,
		private readonly sanitise: (html: string) => string
	) {}

	/** Brings the page to these blocks; returns how many were drawn. */
	update(blocks: readonly PageBlock[]): number {
		const before = this.standing;
		let head = 0;
		while (head < blocks.length && before[head]?.html === blocks[head]?.html) head += 1;
		let tail = 0;
		while (
			tail < Math.min(before.length, blocks.length) - head &&
			before[before.length - 1 - tail]?.html === blocks[blocks.length - 1 - tail]?.html
		)
			tail += 1;
		const gone = before.slice(head, before.length - tail);
		const spare = new Map<string, Standing[]>();
		for (const one of gone) spare.set(one.html, [...(spare.get(one.html) ?? []), one]);
		let drawn = 0;
		const between = blocks.slice(head, blocks.length - tail).map(({ line, html }): Standing => {
			const moved = spare.get(html)?.shift();
			if (moved) return { line, html, nodes: moved.nodes };
			drawn += 1;
			return { line, html, nodes: nodesOf(this.sanitise(html)) };
		});
		for (const left of spare.values()) for (const { nodes } of left) for (const node of nodes) node.remove();
		const after = before.slice(before.length - tail).flatMap(({ nodes }) => nodes)[0] ?? null;
		this.place(between, after);
		const shifted = (kept: Standing[], from: number) =>
			kept.map((one, at): Standing => ({ ...one, line: blocks[from + at]?.line ?? null }));
		this.standing = [
			...shifted(before.slice(0, head), 0),
			...between,
			...shifted(before.slice(before.length - tail), blocks.length - tail)
		];
		return drawn;
	}

	/** Puts blocks before a node, moving none that stands where it should. */
	private place(blocks: readonly Standing[], before: ChildNode | null): void {
		let next = before;
		for (const { nodes } of [...blocks].reverse())
			for (const node of [...nodes].reverse()) {
				if (node.nextSibling !== next || node.parentNode !== this.host) this.host.insertBefore(node, next);
				next = node;
			}
	}

	private blockOf(node: Node): Standing | undefined {
		let top: Node | null = node;
		while (top && top.parentNode !== this.host) top = top.parentNode;
		return top ? this.standing.find(({ nodes }) => nodes.includes(top as ChildNode)) : undefined;
	}

	/** The line of the source that a place on the page comes from, and the element that says so; null outside of blocks. */
	lineOf(node: Node): { line: number; element: Element } | null {
		const block = this.blockOf(node);
		if (!block || block.line === null) return null;
		const inner = (node instanceof Element ? node : node.parentElement)?.closest('[data-line]');
		const element = inner && this.host.contains(inner) && inner !== this.host ? inner : null;
		const first = block.nodes.find((one): one is Element => one instanceof Element);
		const own = Number(element?.getAttribute('data-line') ?? 0);
		const found = element ?? first;
		return found ? { line: block.line + own, element: found } : null;
	}

	/** The element that the text of a line stands in; null where the page has none yet. */
	elementAt(line: number): Element | null {
		const block = this.standing.findLast((one) => one.line !== null && one.line <= line);
		if (!block) return null;
		const elements = block.nodes.filter((one): one is Element => one instanceof Element);
		const lined = elements.flatMap((one) => [one, ...one.querySelectorAll('[data-line]')]);
		const own = line - (block.line ?? 0);
		return lined.findLast((one) => Number(one.getAttribute('data-line') ?? 0) <= own) ?? null;
	}

	/** Every line that begins something, with how far down it stands in the host. */
	lines(): PlacedLine[] {
		const origin = this.host.getBoundingClientRect().top;
		return this.standing.flatMap(({ line, nodes }) => {
			if (line === null) return [];
			const elements = nodes.filter((one): one is Element => one instanceof Element);
			// Lines within a long list or table, but not those of every cell.
			const lined = elements.flatMap((one) => [one, ...one.querySelectorAll('li[data-line], p[data-line]')]);
			return lined.map((one) => ({
				line: line + Number(one.getAttribute('data-line') ?? 0),
				top: one.getBoundingClientRect().top - origin
			}));
		});
	}
}
