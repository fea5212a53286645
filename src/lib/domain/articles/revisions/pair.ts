import { diffArrays } from 'diff';

/** Two things that stand for each other, one that has no counterpart, or two that are the same. */
export type Pair<T> =
	| { state: 'same'; before: T; after: T }
	| { state: 'changed'; before: T; after: T }
	| { state: 'removed'; before: T }
	| { state: 'added'; after: T };

/** Above it two things are taken for one that was changed. */
const alike = 0.35;
/** Past so many edits a list is another list. */
const mostEdits = 4000;
/** Past so many comparisons the ones in the middle are paired by place. */
const mostCells = 20_000;

/** The pairing of a stretch of removed with a stretch of added ones, in order, that is most alike in sum. */
function match<T>(before: T[], after: T[], likeness: (a: T, b: T) => number): [number, number][] {
	if (before.length * after.length > mostCells)
		return before.slice(0, after.length).map((_, index) => [index, index]);
	const rows = before.length + 1;
	const columns = after.length + 1;
	const best = Array.from({ length: rows }, () => new Array<number>(columns).fill(0));
	const at = (i: number, j: number) => best[i]?.[j] ?? 0;
	const scores = before.map((a) => after.map((b) => likeness(a, b)));
	const score = (i: number, j: number) => {
		const value = scores[i]?.[j] ?? 0;
		return value >= alike ? value : 0;
	};
	for (let i = before.length - 1; i >= 0; i--)
		for (let j = after.length - 1; j >= 0; j--) {
			const row = best[i];
			const taken = score(i, j);
			if (row) row[j] = Math.max(at(i + 1, j), at(i, j + 1), taken > 0 ? taken + at(i + 1, j + 1) : 0);
		}
	const pairs: [number, number][] = [];
	for (let i = 0, j = 0; i < before.length && j < after.length;) {
		const taken = score(i, j);
		if (taken > 0 && at(i, j) === taken + at(i + 1, j + 1)) pairs.push([i++, j++]);
		else if (at(i, j) === at(i + 1, j)) i++;
		else j++;
	}
	return pairs;
}

function stretch<T>(before: T[], after: T[], likeness: (a: T, b: T) => number): Pair<T>[] {
	const out: Pair<T>[] = [];
	let i = 0;
	let j = 0;
	const until = (nextI: number, nextJ: number) => {
		for (; i < nextI; i++) out.push({ state: 'removed', before: before[i] as T });
		for (; j < nextJ; j++) out.push({ state: 'added', after: after[j] as T });
	};
	for (const [a, b] of match(before, after, likeness)) {
		until(a, b);
		out.push({ state: 'changed', before: before[a] as T, after: after[b] as T });
		i = a + 1;
		j = b + 1;
	}
	until(before.length, after.length);
	return out;
}

/**
 * Aligns two lists: what is the same by its key stays, what is left between is paired by how alike it is.
 * @param likeness from 0 to 1
 */
export function pair<T>(
	before: T[],
	after: T[],
	key: (item: T) => string,
	likeness: (a: T, b: T) => number
): Pair<T>[] {
	const parts = diffArrays(before.map(key), after.map(key), { maxEditLength: mostEdits });
	if (!parts) return stretch(before, after, likeness);
	const out: Pair<T>[] = [];
	let i = 0;
	let j = 0;
	let gone: T[] = [];
	let come: T[] = [];
	const close = () => {
		out.push(...stretch(gone, come, likeness));
		gone = [];
		come = [];
	};
	for (const { added, removed, count } of parts) {
		if (removed) gone.push(...before.slice(i, (i += count)));
		else if (added) come.push(...after.slice(j, (j += count)));
		else {
			close();
			for (let n = 0; n < count; n++)
				out.push({ state: 'same', before: before[i++] as T, after: after[j++] as T });
		}
	}
	close();
	return out;
}

/** How much two texts share, by their words: 1 where they have the same ones, 0 where none. */
export function sharedWords(a: string, b: string): number {
	const words = (text: string) => text.toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? [];
	const counts = new Map<string, number>();
	const first = words(a);
	for (const word of first) counts.set(word, (counts.get(word) ?? 0) + 1);
	const second = words(b);
	let shared = 0;
	for (const word of second) {
		const left = counts.get(word) ?? 0;
		if (left > 0) {
			shared += 1;
			counts.set(word, left - 1);
		}
	}
	const all = first.length + second.length;
	return all === 0 ? 1 : (2 * shared) / all;
}
