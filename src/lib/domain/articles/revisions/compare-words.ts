import { diffArrays } from 'diff';
import { escapeHtml } from '../html';
import { hasClass, isElement, keyOf, printNode, wrap, type PageElement, type PageNode } from './page-tree';

/** A word, a space, a sign, or something that is never taken apart, with the marks it stands in. */
interface Word {
	html: string;
	blank: boolean;
	path: PageElement[];
	key: string;
}

const inlineTags = new Set([
	...[
		'a',
		'em',
		'strong',
		'del',
		'ins',
		'code',
		'span',
		'br',
		'img',
		'picture',
		'source',
		'sub',
		'sup',
		'svg'
	],
	...['b', 'i', 's', 'small', 'abbr', 'mark', 'q', 'cite', 'time', 'dfn', 'button']
]);

/** Whether something stands within a line of text. */
export const isInline = (node: PageNode): boolean => !isElement(node) || inlineTags.has(node.tag);

/** Numbers from the bench, pictures and drawings are compared whole. */
const isWhole = (node: PageElement): boolean =>
	['br', 'img', 'picture', 'svg'].includes(node.tag) ||
	['reading', 'gain', 'overall'].some((name) => hasClass(node, name));

const pieces = /\s+|[\p{L}\p{N}]+(?:[.,’'-][\p{L}\p{N}]+)*|[^\s\p{L}\p{N}]/gu;

function wordsOf(node: PageNode, path: PageElement[], pathKey: string): Word[] {
	if (isElement(node)) {
		if (isWhole(node))
			return [{ html: printNode(node), blank: false, path, key: `${pathKey}${keyOf(node)}` }];
		const deeper = `${pathKey}${keyOf({ ...node, children: [] })}`;
		return node.children.flatMap((child) => wordsOf(child, [...path, node], deeper));
	}
	return (node.match(pieces) ?? []).map((text) => {
		const blank = text.trim() === '';
		return { html: escapeHtml(text), blank, path, key: `${pathKey}${blank ? ' ' : text}` };
	});
}

type State = 'same' | 'added' | 'removed';
interface Run {
	state: State;
	words: Word[];
}

/** Past so many edits a passage is another passage. */
const mostEdits = 1500;

function runsOf(before: Word[], after: Word[]): Run[] {
	const parts = diffArrays(
		before.map((word) => word.key),
		after.map((word) => word.key),
		{ maxEditLength: mostEdits }
	);
	if (!parts)
		return [
			{ state: 'removed', words: before },
			{ state: 'added', words: after }
		];
	let i = 0;
	let j = 0;
	return parts.map(({ added, removed, count }): Run => {
		if (removed) return { state: 'removed', words: before.slice(i, (i += count)) };
		if (!added) i += count;
		return { state: added ? 'added' : 'same', words: after.slice(j, (j += count)) };
	});
}

/** Changes with nothing but a space between them become one, the removed words first: a phrase reads as a phrase. */
function gathered(runs: Run[]): Run[] {
	const out: Run[] = [];
	let gone: Word[] = [];
	let come: Word[] = [];
	const close = () => {
		if (gone.length > 0) out.push({ state: 'removed', words: gone });
		if (come.length > 0) out.push({ state: 'added', words: come });
		gone = [];
		come = [];
	};
	runs.forEach((run, index) => {
		const changing = gone.length + come.length > 0;
		const between =
			run.state === 'same' && changing && index < runs.length - 1 && run.words.every((word) => word.blank);
		if (run.state === 'removed') gone.push(...run.words);
		else if (run.state === 'added') come.push(...run.words);
		else if (between) {
			gone.push(...run.words);
			come.push(...run.words);
		} else {
			close();
			out.push(run);
		}
	});
	close();
	return out;
}

const marks: Record<State, string | null> = { same: null, added: 'ins', removed: 'del' };

/** Words from a depth on: those of one element stand in it together, the mark of a change innermost. */
function printFrom(words: Word[], depth: number, mark: string | null): string {
	const out: string[] = [];
	for (let at = 0; at < words.length;) {
		const around = words[at]?.path[depth];
		let end = at + 1;
		while (end < words.length && words[end]?.path[depth] === around) end += 1;
		const group = words.slice(at, end);
		if (around) out.push(wrap(around, printFrom(group, depth + 1, mark)));
		else {
			const text = group.map((word) => word.html).join('');
			out.push(mark === null ? text : `<${mark}>${text}</${mark}>`);
		}
		at = end;
	}
	return out.join('');
}

const printRun = ({ state, words }: Run): string => printFrom(words, 0, marks[state]);

/** What stands in a line of text, compared word by word: the markup with what was added and taken away marked in it. */
export function compareWords(before: PageNode[], after: PageNode[]): string {
	const words = (nodes: PageNode[]) => nodes.flatMap((node) => wordsOf(node, [], ''));
	return gathered(runsOf(words(before), words(after)))
		.map(printRun)
		.join('');
}

/** Everything in a line as added or as taken away. */
export const markedWords = (nodes: PageNode[], state: 'added' | 'removed'): string =>
	printRun({ state, words: nodes.flatMap((node) => wordsOf(node, [], '')) });
