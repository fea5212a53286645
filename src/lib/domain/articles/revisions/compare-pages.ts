import { compareTables, movedFigures } from './compare-tables';
import { compareWords, isInline, markedWords } from './compare-words';
import { pair, sharedWords } from './pair';
import {
	findAll,
	hasClass,
	isElement,
	keyOf,
	printNode,
	textOf,
	wrap,
	type PageElement,
	type PageNode
} from './page-tree';

/** A block of the page as the comparison shows it. */
export interface ComparedBlock {
	state: 'same' | 'changed' | 'added' | 'removed';
	/** With what changed marked in it; to be sanitised like the page itself. */
	html: string;
}

/** Stretches of text between blocks, as in a list item, are a block of their own without a tag. */
function blocksOf(nodes: PageNode[]): PageElement[] {
	const out: PageElement[] = [];
	let line: PageNode[] = [];
	const close = () => {
		if (line.some((node) => isElement(node) || node.trim() !== ''))
			out.push({ tag: '', attributes: {}, children: line });
		line = [];
	};
	for (const node of nodes) {
		if (isInline(node)) line.push(node);
		else {
			close();
			if (isElement(node)) out.push(node);
		}
	}
	close();
	return out;
}

const around = (block: PageElement, inner: string): string => (block.tag === '' ? inner : wrap(block, inner));
const print = (block: PageElement): string => around(block, block.children.map(printNode).join(''));
const isLine = (block: PageElement): boolean => block.children.every(isInline);

const sourceOf = (block: PageElement): string | undefined => findAll(block, 'img')[0]?.attributes.src;
const isPicture = (block: PageElement): boolean => hasClass(block, 'picture');
const isPlate = (block: PageElement): boolean => hasClass(block, 'plate');
const titleOf = (block: PageElement): string => findAll(block, 'h3').map(textOf).join('');

/** How likely one block is the other, changed: of the same kind, and by the words they share. */
function likeness(a: PageElement, b: PageElement): number {
	if (a.tag !== b.tag || isPlate(a) !== isPlate(b) || isPicture(a) !== isPicture(b)) return 0;
	if (isPicture(a)) return sourceOf(a) === sourceOf(b) ? 1 : 0.36;
	if (isPlate(a)) return titleOf(a) === titleOf(b) ? 1 : sharedWords(textOf(a), textOf(b));
	return sharedWords(textOf(a), textOf(b));
}

/** A plate is compared by its numbers: which of them moved, under the plate as it is now. */
function comparePlates(before: PageElement, after: PageElement): string {
	const numbers = (block: PageElement) => findAll(block, 'table')[0];
	const words = after.children.map((child) => {
		if (!isElement(child) || !['h3', 'p'].includes(child.tag)) return printNode(child);
		const old = before.children.find(
			(one) => isElement(one) && one.tag === child.tag && one.attributes.class === child.attributes.class
		);
		return old && isElement(old) ? wrap(child, compareWords(old.children, child.children)) : printNode(child);
	});
	return wrap(after, words.join('') + movedFigures(numbers(before), numbers(after)));
}

/** Pictures are compared by their hash: another file is another picture, and both are shown. */
function comparePictures(before: PageElement, after: PageElement): string {
	const captions = (block: PageElement) => findAll(block, 'figcaption')[0]?.children ?? [];
	const shown = ({ children }: PageElement, mark: 'ins' | 'del') =>
		`<${mark}>${children
			.filter((one) => isElement(one) && one.tag !== 'figcaption')
			.map(printNode)
			.join('')}</${mark}>`;
	const pictures =
		sourceOf(before) === sourceOf(after)
			? after.children
					.filter((one) => isElement(one) && one.tag !== 'figcaption')
					.map(printNode)
					.join('')
			: shown(before, 'del') + shown(after, 'ins');
	const alt = (block: PageElement) => findAll(block, 'img')[0]?.attributes.alt ?? '';
	const alts =
		alt(before) === alt(after)
			? ''
			: `<p class="picture-alt">Its text: ${compareWords([alt(before)], [alt(after)])}</p>`;
	return wrap(
		after,
		`${pictures}<figcaption>${compareWords(captions(before), captions(after))}</figcaption>${alts}`
	);
}

/** Everything in a block marked as added or as taken away, down to its lines. */
function whole(block: PageElement, state: 'added' | 'removed'): string {
	if (isPlate(block) || isPicture(block) || block.tag === 'pre') return print(block);
	if (isLine(block)) return around(block, markedWords(block.children, state));
	if (block.tag === 'hr') return print(block);
	return around(
		block,
		block.children.map((child) => (isElement(child) ? whole(child, state) : printNode(child))).join('')
	);
}

function changed(before: PageElement, after: PageElement): string {
	if (isPlate(after)) return comparePlates(before, after);
	if (isPicture(after)) return comparePictures(before, after);
	if (after.tag === 'table') return compareTables(before, after);
	if (isLine(before) && isLine(after)) return around(after, compareWords(before.children, after.children));
	return around(
		after,
		comparePages(before.children, after.children)
			.map(({ html }) => html)
			.join('')
	);
}

/**
 * Two pages block by block, in reading order: which blocks are the same, which came and went, and in those that changed
 * which words did, in paragraphs, in list items, and inside the cells of tables; plates by their figures, pictures by
 * their hash.
 */
export function comparePages(before: PageNode[], after: PageNode[]): ComparedBlock[] {
	return pair(blocksOf(before), blocksOf(after), keyOf, likeness).map((one): ComparedBlock => {
		switch (one.state) {
			case 'same':
				return { state: 'same', html: print(one.after) };
			case 'changed':
				return { state: 'changed', html: changed(one.before, one.after) };
			case 'added':
				return { state: 'added', html: whole(one.after, 'added') };
			case 'removed':
				return { state: 'removed', html: whole(one.before, 'removed') };
		}
	});
}

/** A page of the comparison with the middle of long unchanged stretches left out. */
export type ShownBlock = ComparedBlock | { state: 'skipped'; blocks: number };

/** Leaves out unchanged blocks but for one on each side of a change. */
export function aroundChanges(blocks: ComparedBlock[]): ShownBlock[] {
	const near = (index: number) =>
		[index - 1, index, index + 1].some((at) => (blocks[at]?.state ?? 'same') !== 'same');
	const out: ShownBlock[] = [];
	let skipped = 0;
	blocks.forEach((block, index) => {
		if (!near(index)) skipped += 1;
		else {
			if (skipped > 0) out.push({ state: 'skipped', blocks: skipped });
			skipped = 0;
			out.push(block);
		}
	});
	if (skipped > 0) out.push({ state: 'skipped', blocks: skipped });
	return out;
}
