import { diffArrays } from 'diff';
import { element, escapeHtml } from '../html';
import { compareWords, markedWords } from './compare-words';
import { pair, sharedWords } from './pair';
import { findAll, isElement, keyOf, textOf, wrap, type PageElement } from './page-tree';

const cellsOf = (row: PageElement): PageElement[] =>
	row.children.filter(isElement).filter(({ tag }) => tag === 'td' || tag === 'th');
const words = (node: PageElement): string => textOf(node).replace(/\s+/g, ' ').trim();

/** Which column of the one table stands for which of the other; null where there is none. */
type Columns = { before: number | null; after: number | null }[];

function columnsOf(before: PageElement | undefined, after: PageElement | undefined): Columns {
	const names = (row: PageElement | undefined) => (row ? cellsOf(row).map(words) : []);
	const [a, b] = [names(before), names(after)];
	// As many as before, under other names: renamed, not replaced.
	if (a.length === b.length) return a.map((_, index) => ({ before: index, after: index }));
	let i = 0;
	let j = 0;
	return diffArrays(a, b).flatMap(({ added, removed, count }) =>
		Array.from({ length: count }, () => ({ before: added ? null : i++, after: removed ? null : j++ }))
	);
}

function compareRow(before: PageElement, after: PageElement, columns: Columns): string {
	const [a, b] = [cellsOf(before), cellsOf(after)];
	const fits = a.length <= columns.length && b.length <= columns.length && a.length > 1 && b.length > 1;
	const plan: Columns = fits
		? columns
		: Array.from({ length: Math.max(a.length, b.length) }, (_, index) => ({
				before: index < a.length ? index : null,
				after: index < b.length ? index : null
			}));
	return wrap(
		after,
		plan
			.map(({ before: from, after: to }) => {
				const old = from === null ? undefined : a[from];
				const now = to === null ? undefined : b[to];
				if (old && now) return wrap(now, compareWords(old.children, now.children));
				if (now) return wrap(now, markedWords(now.children, 'added'));
				return old ? wrap(old, markedWords(old.children, 'removed')) : '';
			})
			.join('')
	);
}

const wholeRow = (row: PageElement, state: 'added' | 'removed'): string =>
	wrap(
		row,
		cellsOf(row)
			.map((cell) => wrap(cell, markedWords(cell.children, state)))
			.join('')
	);

/** Two rows of one name are one row, whatever became of its figures. */
const likeRows = (a: PageElement, b: PageElement): number => {
	const [first, second] = [cellsOf(a)[0], cellsOf(b)[0]];
	const sameName = first && second && words(first) === words(second) && words(first) !== '';
	return sameName ? 1 : sharedWords(words(a), words(b));
};

const headOf = (table: PageElement): PageElement | undefined =>
	findAll(table, 'thead').flatMap((head) => findAll(head, 'tr'))[0];

/** Two tables as one: rows by their names, columns by their heads, words marked inside the cells. */
export function compareTables(before: PageElement, after: PageElement): string {
	const [oldHead, newHead] = [headOf(before), headOf(after)];
	const columns = columnsOf(oldHead, newHead);
	const rows = (table: PageElement, head: PageElement | undefined) =>
		findAll(table, 'tr').filter((row) => row !== head);
	const body = pair(rows(before, oldHead), rows(after, newHead), keyOf, likeRows)
		.map((one) => {
			if (one.state === 'added') return wholeRow(one.after, 'added');
			if (one.state === 'removed') return wholeRow(one.before, 'removed');
			return compareRow(one.before, one.after, columns);
		})
		.join('');
	const head =
		oldHead && newHead ? compareRow(oldHead, newHead, columns) : newHead ? wholeRow(newHead, 'added') : '';
	const caption = findAll(after, 'caption')
		.map((one) => wrap(one, markedOr(findAll(before, 'caption')[0], one)))
		.join('');
	return wrap(after, `${caption}<thead>${head}</thead><tbody>${body}</tbody>`);
}

const markedOr = (before: PageElement | undefined, after: PageElement): string =>
	before ? compareWords(before.children, after.children) : markedWords(after.children, 'added');

interface Figure {
	row: string;
	column: string;
	value: string;
}

/** Each figure of a table under the names of its row and its column; rows under a head of their own carry it along. */
function figuresOf(table: PageElement | undefined): Figure[] {
	if (!table) return [];
	const head = headOf(table);
	const names = head ? cellsOf(head).map(words) : [];
	let group = '';
	return findAll(table, 'tr')
		.filter((row) => row !== head)
		.flatMap((row) => {
			const [first, ...rest] = cellsOf(row);
			if (rest.length === 0) {
				group = first ? `${words(first)}, ` : '';
				return [];
			}
			const name = group + (first ? words(first) : '');
			return rest.map((cell, index) => ({ row: name, column: names[index + 1] ?? '', value: words(cell) }));
		});
}

const named = (names: string[]): string =>
	names.length > 8 ? `${names.slice(0, 8).join('; ')}; and ${names.length - 8} more` : names.join('; ');

/** Rows that are in one of the two tables alone, in a sentence. */
function rowsAlone(words: string, rows: string[], mark: 'ins' | 'del'): string {
	return rows.length === 0 ? '' : element('p', {}, `${words} ${element(mark, {}, escapeHtml(named(rows)))}.`);
}

/** Which figures of a table moved from what to what, as a table, and which rows came and went; empty where none did. */
export function movedFigures(before: PageElement | undefined, after: PageElement | undefined): string {
	const [was, is] = [figuresOf(before), figuresOf(after)];
	const rowsOf = (figures: Figure[]) => [...new Set(figures.map(({ row }) => row))];
	const [oldRows, newRows] = [rowsOf(was), rowsOf(is)];
	const gone = oldRows.filter((row) => !newRows.includes(row));
	const come = newRows.filter((row) => !oldRows.includes(row));
	const id = ({ row, column }: Figure) => `${row}\n${column}`;
	const [old, now] = [was, is].map((figures) => new Map(figures.map((one) => [id(one), one])));
	const moved = [...new Map([...(old ?? []), ...(now ?? [])]).values()]
		.filter(({ row }) => oldRows.includes(row) && newRows.includes(row))
		.map((one) => ({ ...one, from: old?.get(id(one))?.value, to: now?.get(id(one))?.value }))
		.filter(({ from, to }) => from !== to);
	const cell = (value: string | undefined, mark: 'ins' | 'del') =>
		element('td', { class: 'num' }, value === undefined ? 'none' : element(mark, {}, escapeHtml(value)));
	const rows = moved.map(
		({ row, column, from, to }) =>
			`<tr>${element('th', { scope: 'row' }, escapeHtml(row))}${element('td', {}, escapeHtml(column))}${cell(from, 'del')}${cell(to, 'ins')}</tr>`
	);
	const head = ['Figure', 'Of it', 'From', 'To']
		.map((text, index) => element('th', { scope: 'col', class: index > 1 ? 'num' : undefined }, text))
		.join('');
	const list =
		rows.length === 0
			? ''
			: element(
					'div',
					{ class: 'table-box', tabindex: 0, role: 'group', 'aria-label': 'Figures that moved' },
					`<table><caption>Figures that moved</caption><thead><tr>${head}</tr></thead><tbody>${rows.join('')}</tbody></table>`
				);
	return rowsAlone('No longer in it:', gone, 'del') + rowsAlone('New in it:', come, 'ins') + list;
}
